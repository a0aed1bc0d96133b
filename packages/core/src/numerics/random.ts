// Random numbers that a seed repeats exactly, on every machine.

export interface RandomNumbers {
  /** evenly in [0, 1) */
  uniform(): number;
  /** mean 0, standard deviation 1 */
  normal(): number;
}

const TWO_32 = 2 ** 32;
/** Weyl step of the sequence that fills the state from the seed: 2³² over the golden ratio, odd (Steele, Lea and Flood 2014). */
const WEYL = 0x9e3779b9;

/**
 * xoshiro128** (Blackman and Vigna, ACM Trans. Math. Softw. 47, 2021; from memory), its state filled from the seed by a
 * mixed Weyl sequence; normals in pairs by Box and Muller (1958).
 * @param seed any integer; taken modulo 2³²
 */
export function randomNumbers(seed: number): RandomNumbers {
  const state = seededState(seed);
  let spare: number | undefined;
  const uniform = (): number => next(state) / TWO_32;
  const normal = (): number => {
    if (spare !== undefined) {
      const value = spare;
      spare = undefined;
      return value;
    }
    const radius = Math.sqrt(-2 * Math.log(1 - uniform()));
    const angle = 2 * Math.PI * uniform();
    spare = radius * Math.sin(angle);
    return radius * Math.cos(angle);
  };
  return { uniform, normal };
}

function seededState(seed: number): Uint32Array {
  let weyl = seed >>> 0;
  return Uint32Array.from({ length: 4 }, () => {
    weyl = (weyl + WEYL) >>> 0;
    let z = weyl;
    z = Math.imul(z ^ (z >>> 16), 0x21f0aaad);
    z = Math.imul(z ^ (z >>> 15), 0x735a2d97);
    return (z ^ (z >>> 15)) >>> 0;
  });
}

function next(s: Uint32Array): number {
  const result = Math.imul(rotate(Math.imul(s[1]!, 5), 7), 9) >>> 0;
  const shifted = s[1]! << 9;
  s[2]! ^= s[0]!;
  s[3]! ^= s[1]!;
  s[1]! ^= s[2]!;
  s[0]! ^= s[3]!;
  s[2]! ^= shifted;
  s[3] = rotate(s[3]!, 11);
  return result;
}

function rotate(x: number, by: number): number {
  return (x << by) | (x >>> (32 - by));
}
