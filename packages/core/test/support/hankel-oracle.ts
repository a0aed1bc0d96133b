// Point potential in layered ground by another road: the interface conditions solved as a linear system at each
// wavenumber, then the Hankel integral summed numerically. Shares no formula with the image lists.
import { Matrix, solve } from 'ml-matrix';
import { gaussLegendre } from '../../src/numerics/gauss-legendre.ts';
import type { SoilModel } from '../../src/soil/soil-model.ts';

/** Kernel at one wavenumber for a unit source, without ρ/4π of its layer, less the direct term when in its own layer. */
export function kernelByInterfaceConditions(
  soil: SoilModel,
  d: number,
  z: number,
  wavenumber: number,
): number {
  const n = soil.layers.length;
  const top: number[] = [];
  const bottom: number[] = [];
  let depth = 0;
  for (const layer of soil.layers) {
    top.push(depth);
    depth += layer.thickness;
    bottom.push(depth);
  }
  const inLayer = (at: number): number => {
    let i = 0;
    while (i < n - 1 && at > bottom[i]!) i++;
    return i;
  };
  const s = inLayer(d);
  const f = inLayer(z);
  // layer i: a_i e^{−λ(z − top)} + b_i e^{−λ(bottom − z)}; unknowns a_0 b_0 a_1 b_1 … a_{n−1}
  const a = (i: number): number => 2 * i;
  const b = (i: number): number => 2 * i + 1;
  const size = 2 * n - 1;
  const system = Matrix.zeros(size, size);
  const right = Matrix.zeros(size, 1);
  const source = (i: number, at: number): [value: number, slope: number] =>
    i !== s
      ? [0, 0]
      : [
          Math.exp(-wavenumber * Math.abs(at - d)),
          -Math.sign(at - d) * Math.exp(-wavenumber * Math.abs(at - d)),
        ];
  const decay = (i: number): number => (i === n - 1 ? 0 : Math.exp(-wavenumber * soil.layers[i]!.thickness));
  // slope (over λ) at the surface is zero; a source on the surface counts as just below it
  system.set(0, a(0), -1);
  if (n > 1) system.set(0, b(0), decay(0));
  right.set(0, 0, s === 0 ? -Math.exp(-wavenumber * d) : 0);
  for (let i = 0; i < n - 1; i++) {
    const at = bottom[i]!;
    const last = i + 1 === n - 1;
    const g1 = 1 / soil.layers[i]!.resistivity;
    const g2 = 1 / soil.layers[i + 1]!.resistivity;
    const [v1, s1] = source(i, at);
    const [v2, s2] = source(i + 1, at);
    const [row, next] = [1 + 2 * i, 2 + 2 * i];
    system.set(row, a(i), decay(i));
    system.set(row, b(i), 1);
    system.set(row, a(i + 1), -1);
    if (!last) system.set(row, b(i + 1), -decay(i + 1));
    right.set(row, 0, v2 - v1);
    system.set(next, a(i), -g1 * decay(i));
    system.set(next, b(i), g1);
    system.set(next, a(i + 1), g2);
    if (!last) system.set(next, b(i + 1), -g2 * decay(i + 1));
    right.set(next, 0, g2 * s2 - g1 * s1);
  }
  // resistivities of very different size: rows scaled to their largest entry
  for (let r = 0; r < size; r++) {
    const scale = Math.max(...system.getRow(r).map(Math.abs));
    system.mulRow(r, 1 / scale);
    right.set(r, 0, right.get(r, 0) / scale);
  }
  const x = solve(system, right).to1DArray();
  const up = f === n - 1 ? 0 : x[b(f)]! * Math.exp(-wavenumber * (bottom[f]! - z));
  return x[a(f)]! * Math.exp(-wavenumber * (z - top[f]!)) + up;
}

/** J0 by its integral (1/π)∫cos(x sin θ)dθ, trapezium rule: exact to rounding once the points outnumber x. */
function besselJ0(x: number): number {
  const points = Math.ceil(x / 2) + 24;
  let sum = 0;
  for (let k = 0; k < points; k++) sum += Math.cos(x * Math.sin((Math.PI * (k + 0.5)) / points));
  return sum / points;
}

/**
 * Potential of a unit current, Ω, by ∫ kernel·J0(λr) dλ over log-spaced panels.
 * @param least the kernel less its direct term decays at least like e^{−λ·least}, m; greater than 0
 */
export function potentialByHankel(soil: SoilModel, d: number, z: number, r: number, least: number): number {
  let layer = 0;
  let depth = soil.layers[0]!.thickness;
  while (layer < soil.layers.length - 1 && d > depth) depth += soil.layers[++layer]!.thickness;
  const factor = soil.layers[layer]!.resistivity / (4 * Math.PI);
  const reach = soil.layers.slice(0, -1).reduce((sum, l) => sum + l.thickness, 1);
  const contrast = soil.layers.reduce(
    (most, l) => Math.max(most, ...soil.layers.map((m) => m.resistivity / l.resistivity)),
    1,
  );
  const from = 1e-7 / (reach * contrast + r);
  const to = 45 / least;
  const { points, weights } = gaussLegendre(10);
  let sum = from * kernelByInterfaceConditions(soil, d, z, from);
  let low = from;
  while (low < to) {
    const high = Math.min(to, Math.min(low * 1.35, low + Math.PI / Math.max(r, 1e-9)));
    for (let k = 0; k < points.length; k++) {
      const wavenumber = low + points[k]! * (high - low);
      sum +=
        weights[k]! *
        (high - low) *
        kernelByInterfaceConditions(soil, d, z, wavenumber) *
        besselJ0(wavenumber * r);
    }
    low = high;
  }
  let f = 0;
  let below = soil.layers[0]!.thickness;
  while (f < soil.layers.length - 1 && z > below) below += soil.layers[++f]!.thickness;
  const direct = f === layer ? 1 / Math.hypot(r, z - d) : 0;
  return factor * (sum + direct);
}
