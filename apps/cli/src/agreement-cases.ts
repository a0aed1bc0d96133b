// Published and independently computed electrodes that the README's table of agreement is printed from.

/** Straight conductor: x1, y1, depth1, x2, y2, depth2, radius; m. */
export type Bar = readonly [number, number, number, number, number, number, number];

export interface AgreementCase {
  readonly name: string;
  readonly source: string;
  readonly bars: readonly Bar[];
  /** resistivity Ω·m, thickness m, from the surface down */
  readonly layers: readonly (readonly [number, number?])[];
  readonly resistance: number;
  /** worst touch voltage over the rise, %, in the corner mesh of this side */
  readonly touch?: { readonly percent: number; readonly mesh: number };
}

function grid(
  width: number,
  height: number,
  across: number,
  up: number,
  depth: number,
  radius: number,
): Bar[] {
  const along = Array.from({ length: across + 1 }, (_, i): Bar => {
    const x = (width * i) / across;
    return [x, 0, depth, x, height, depth, radius];
  });
  const over = Array.from({ length: up + 1 }, (_, j): Bar => {
    const y = (height * j) / up;
    return [0, y, depth, width, y, depth, radius];
  });
  return [...along, ...over];
}

const rod = (x: number, y: number, top: number, bottom: number, radius: number): Bar => [
  x,
  y,
  top,
  x,
  y,
  bottom,
  radius,
];

const nodes = (width: number, height: number, pitch: number): [number, number][] => {
  const found: [number, number][] = [];
  for (let x = 0; x <= width; x += pitch) for (let y = 0; y <= height; y += pitch) found.push([x, y]);
  return found;
};

const balaidos = [
  ...grid(60, 80, 6, 8, 0.8, 0.00564),
  ...nodes(60, 80, 10).map(([x, y]) => rod(x, y, 0.8, 2.3, 0.007)),
];
const small = grid(20, 20, 4, 4, 0.5, 0.005);
const cornered = [...small, ...nodes(20, 20, 20).map(([x, y]) => rod(x, y, 0.5, 10, 0.008))];
const independent = 'independent computation';
const colominas = 'Colominas 2002, plan rebuilt, from memory';

export const agreementCases: readonly AgreementCase[] = [
  { name: 'grid 70 m, 100 meshes, uniform 400 Ω·m (IEEE 80 annex B.1)', source: independent, bars: grid(70, 70, 10, 10, 0.5, 0.005), layers: [[400]], resistance: 2.65 },
  { name: 'grid 60 m, 36 meshes, uniform', source: independent, bars: grid(60, 60, 6, 6, 0.5, 0.005), layers: [[100]], resistance: 0.8072, touch: { percent: 24.26, mesh: 10 } },
  { name: 'grid 20 m, 16 meshes, uniform', source: independent, bars: small, layers: [[100]], resistance: 2.3583, touch: { percent: 24.67, mesh: 5 } },
  { name: 'the same, 0.6 m of 100 over 5.26 Ω·m', source: independent, bars: small, layers: [[100, 0.6], [5.2632]], resistance: 0.42214, touch: { percent: 77.51, mesh: 5 } },
  { name: 'the same, 0.3 m of 100 over 1900 Ω·m', source: independent, bars: small, layers: [[100, 0.3], [1900]], resistance: 33.895, touch: { percent: 32.2, mesh: 5 } },
  { name: 'the same with 10 m corner rods, four layers', source: independent, bars: cornered, layers: [[200, 1], [50, 3], [800, 4], [20]], resistance: 1.2986, touch: { percent: 26.63, mesh: 5 } },
  { name: 'rod 3 m through 0.5 m of 100 into 1000 Ω·m', source: independent, bars: [rod(0, 0, 0, 3, 0.007)], layers: [[100, 0.5], [1000]], resistance: 154.75 },
  { name: 'Balaidos A, uniform 50 Ω·m', source: colominas, bars: balaidos, layers: [[50]], resistance: 0.3366 },
  { name: 'Balaidos B, 0.7 m of 400 over 50 Ω·m', source: colominas, bars: balaidos, layers: [[400, 0.7], [50]], resistance: 0.3522 },
  { name: 'Balaidos C, 1.0 m of 400 over 50 Ω·m', source: colominas, bars: balaidos, layers: [[400, 1], [50]], resistance: 0.486 },
]; // biome-ignore format: one row a case
