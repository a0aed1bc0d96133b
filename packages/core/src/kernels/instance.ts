// Compiled kernels: one instance a module, made on first use; none where WebAssembly is missing or blocked.

/** An instance with memory of its own; a shared one (`kernelOf`) holds nothing from one call to the next. */
export interface Kernel {
  readonly memory: WebAssembly.Memory;
  /** calls an exported function; addresses and counts are whole numbers */
  call(name: string, ...values: number[]): number;
  /** an exported function, for many calls */
  find(name: string): (...values: number[]) => unknown;
}

/** Bytes of a page of WebAssembly memory (WebAssembly core specification 2.0, 4.2.8). */
const PAGE = 65536;
/** First address given out: 0 is kept for "none". */
const BASE = 1024;
/** Alignment of arrays: a pair of doubles. */
const ALIGN = 16;
export const BYTES_A_DOUBLE: number = Float64Array.BYTES_PER_ELEMENT;

const made = new Map<string, Kernel | undefined>();
const compiled = new Map<string, WebAssembly.Module>();
let allowed = true;

/** Turns the kernels off or on again: what they do is then done by plain code, with the same results to rounding. */
export function useKernels(on: boolean): void {
  allowed = on;
}

/**
 * The instance of a module.
 * @param bytes the module as base64
 * @returns undefined where WebAssembly is missing, lacks SIMD, is forbidden by the page's policy, or may not compile
 * at once on a page's main thread: plain code then takes over
 */
export function kernelOf(bytes: string): Kernel | undefined {
  if (!allowed) return undefined;
  if (!made.has(bytes)) made.set(bytes, instantiate(bytes));
  return made.get(bytes);
}

/** A new instance of a module with memory that nobody else writes to, so that data may stay in it; undefined as above. */
export function ownKernel(bytes: string): Kernel | undefined {
  return allowed ? instantiate(bytes) : undefined;
}

function moduleOf(bytes: string): WebAssembly.Module {
  const known = compiled.get(bytes);
  if (known !== undefined) return known;
  const module = new WebAssembly.Module(Uint8Array.from(atob(bytes), (letter) => letter.charCodeAt(0)));
  compiled.set(bytes, module);
  return module;
}

function instantiate(bytes: string): Kernel | undefined {
  if (typeof WebAssembly !== 'object') return undefined;
  try {
    const abort = (): never => {
      throw new Error('kernel stopped');
    };
    const { exports } = new WebAssembly.Instance(moduleOf(bytes), { env: { abort } });
    const memory = exports.memory;
    if (!(memory instanceof WebAssembly.Memory)) return undefined;
    const find = (name: string): ((...values: number[]) => unknown) => {
      const f = exports[name];
      if (typeof f !== 'function') throw new TypeError(`kernel has no function ${name}`);
      return (...values) => f(...values);
    };
    return { memory, find, call: (name, ...values) => Number(find(name)(...values) ?? 0) };
  } catch {
    return undefined;
  }
}

/**
 * Copies arrays into a kernel's memory, over whatever was there.
 * @param room doubles wanted after them
 * @returns address of each, then the first free one; undefined where memory of that size is refused
 */
export function place(
  kernel: Kernel,
  arrays: readonly Float64Array[],
  room: number = 0,
): number[] | undefined {
  const addresses: number[] = [];
  let at = BASE;
  for (const array of arrays) {
    addresses.push(at);
    at += Math.ceil(array.byteLength / ALIGN) * ALIGN;
  }
  addresses.push(at);
  if (!reserve(kernel, at + room * Float64Array.BYTES_PER_ELEMENT)) return undefined;
  arrays.forEach((array, k) => {
    new Float64Array(kernel.memory.buffer, addresses[k]!, array.length).set(array);
  });
  return addresses;
}

/** Grows a kernel's memory to at least so many bytes, with what it holds; false where they are refused. */
export function reserve(kernel: Kernel, bytes: number): boolean {
  const missing = bytes - kernel.memory.buffer.byteLength;
  if (missing <= 0) return true;
  try {
    kernel.memory.grow(Math.ceil(missing / PAGE));
    return true;
  } catch {
    return false;
  }
}

/** An instance whose memory is given out piece by piece, for data that stay. */
export interface Store {
  readonly kernel: Kernel;
  /** first free address */
  free: number;
}

/** An empty store; undefined as kernelOf. */
export function storeOf(bytes: string): Store | undefined {
  const kernel = ownKernel(bytes);
  return kernel && { kernel, free: BASE };
}

/** @returns address of a piece of so many bytes; undefined where they are refused, with nothing changed */
export function take(store: Store, bytes: number): number | undefined {
  const at = store.free;
  const next = at + Math.ceil(bytes / ALIGN) * ALIGN;
  if (!reserve(store.kernel, next)) return undefined;
  store.free = next;
  return at;
}

/** Doubles at an address of a kernel's memory, valid until the next `place`. */
export function doublesAt(kernel: Kernel, address: number, length: number): Float64Array {
  return new Float64Array(kernel.memory.buffer, address, length);
}
