// Wall and processor time of a piece of work in this process.

export interface Timed<T> {
  readonly wallMs: number;
  /** of the whole process, all its threads */
  readonly cpuMs: number;
  readonly result: T;
}

export async function timed<T>(work: () => T | Promise<T>): Promise<Timed<T>> {
  const cpu = process.cpuUsage();
  const start = performance.now();
  const result = await work();
  const wallMs = performance.now() - start;
  const { user, system } = process.cpuUsage(cpu);
  return { wallMs, cpuMs: (user + system) / 1000, result };
}
