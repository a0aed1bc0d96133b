// Runs the largest case in another process of this program, and reads back what it found.
import type { SoilName } from './bench-cases.ts';
import { goals } from './bench-claims.ts';
import type { Part, Surroundings } from './bench-stage.ts';

/** Option, followed by soil and rounds, on which `bench.js` runs the largest case alone and prints it as JSON. */
export const LARGE_OPTION = '--large';

export async function largeByChild(
  soil: SoilName,
  rounds: number,
  { spawner, told }: Surroundings,
): Promise<Part> {
  told(`largest case, ${soil}: in a process of its own`);
  const script = process.argv[1] ?? '';
  const ended = await spawner(process.execPath, [script, LARGE_OPTION, soil, String(rounds)], process.env);
  if (ended.status !== 0)
    return {
      lines: [
        `**Largest case, ${soil}:** ended with ${ended.status ?? 'no status'}: ${lastLine(ended.stderr)}`,
      ],
    };
  return partOf(JSON.parse(ended.stdout));
}

/** @throws TypeError for anything but the JSON of a part without gates */
export function partOf(said: unknown): Part {
  const given = typeof said === 'object' && said !== null ? new Map(Object.entries(said)) : new Map();
  const lines: unknown = given.get('lines');
  const findings: unknown = given.get('findings');
  if (!Array.isArray(lines) || typeof findings !== 'object' || findings === null)
    throw new TypeError('the largest case printed no lines and findings');
  const known = Object.entries(findings).filter(
    (pair): pair is [string, number] => pair[0] in goals && typeof pair[1] === 'number',
  );
  return { lines: lines.map(String), findings: Object.fromEntries(known) };
}

function lastLine(text: string): string {
  return text.trim().split('\n').at(-1) ?? '';
}
