// SHA-256 in plain arithmetic, for pages of plain http hosts, to which browsers grant no crypto.subtle.

const BLOCK = 64;
const LENGTH_BYTES = 8;
const ROUNDS = 64;

function primes(count: number): readonly number[] {
  const found: number[] = [];
  for (let n = 2; found.length < count; n++) if (found.every((p) => n % p !== 0)) found.push(n);
  return found;
}

/** The first 32 bits of the fraction of the root of `n`, `degree` 2 or 3, exactly. */
function rootBits(n: number, degree: 2 | 3): number {
  const scaled = BigInt(n) << BigInt(32 * degree);
  let low = 0n;
  let high = 1n << 40n;
  while (high - low > 1n) {
    const middle = (low + high) >> 1n;
    if (middle ** BigInt(degree) <= scaled) low = middle;
    else high = middle;
  }
  return Number(low & 0xffffffffn);
}

/** FIPS 180-4 (2015), 5.3.3: fractions of the square roots of the first eight primes. */
const BEGIN = Uint32Array.from(primes(8), (p) => rootBits(p, 2));
/** FIPS 180-4 (2015), 4.2.2: fractions of the cube roots of the first sixty-four primes. */
const K = Uint32Array.from(primes(ROUNDS), (p) => rootBits(p, 3));

function turned(x: number, by: number): number {
  return (x >>> by) | (x << (32 - by));
}

/** FIPS 180-4 (2015), 5.1.1: a one bit, zeros, and the length in bits, to whole blocks. */
function padded(bytes: Uint8Array): DataView {
  const size = Math.ceil((bytes.length + 1 + LENGTH_BYTES) / BLOCK) * BLOCK;
  const all = new Uint8Array(size);
  all.set(bytes);
  all[bytes.length] = 0x80;
  const view = new DataView(all.buffer);
  view.setBigUint64(size - LENGTH_BYTES, BigInt(bytes.length) * 8n);
  return view;
}

/**
 * The SHA-256 digest, FIPS 180-4 (2015), 6.2.2, in its symbols: W the schedule, a to h the working variables.
 * @returns 32 bytes
 */
export function plainSha256(bytes: Uint8Array): Uint8Array {
  const view = padded(bytes);
  const hash = Uint32Array.from(BEGIN);
  const W = new Uint32Array(ROUNDS);
  for (let at = 0; at < view.byteLength; at += BLOCK) {
    for (let t = 0; t < 16; t++) W[t] = view.getUint32(at + 4 * t);
    for (let t = 16; t < ROUNDS; t++) {
      const x = W[t - 15]!;
      const y = W[t - 2]!;
      const s0 = turned(x, 7) ^ turned(x, 18) ^ (x >>> 3);
      const s1 = turned(y, 17) ^ turned(y, 19) ^ (y >>> 10);
      W[t] = s1 + W[t - 7]! + s0 + W[t - 16]!;
    }
    let [a = 0, b = 0, c = 0, d = 0, e = 0, f = 0, g = 0, h = 0] = hash;
    for (let t = 0; t < ROUNDS; t++) {
      const S1 = turned(e, 6) ^ turned(e, 11) ^ turned(e, 25);
      const T1 = (h + S1 + ((e & f) ^ (~e & g)) + K[t]! + W[t]!) | 0;
      const S0 = turned(a, 2) ^ turned(a, 13) ^ turned(a, 22);
      const T2 = (S0 + ((a & b) ^ (a & c) ^ (b & c))) | 0;
      [h, g, f, e, d, c, b, a] = [g, f, e, (d + T1) | 0, c, b, a, (T1 + T2) | 0];
    }
    [a, b, c, d, e, f, g, h].forEach((value, i) => {
      hash[i] = hash[i]! + value;
    });
  }
  const digest = new DataView(new ArrayBuffer(4 * hash.length));
  hash.forEach((word, i) => {
    digest.setUint32(4 * i, word);
  });
  return new Uint8Array(digest.buffer);
}
