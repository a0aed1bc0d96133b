// Maps of one box one after another, each finer: something to show within a frame, and what it may still miss.
import { type Box, latticeValue } from './lattice.ts';
import type { SurfaceMap } from './surface-map.ts';
import type { SurfacePotentials } from './surface-potential.ts';

export interface ProgressiveMap extends SurfaceMap {
  /** m */
  readonly spacing: number;
  /**
   * By leakage, the largest difference of the map's cubic interpolation from the field at a sample of places between
   * points: what may be missed where the map is drawn, while each lattice's `error` is that of its own points.
   */
  readonly between: readonly number[];
}

/** Places between points that are compared. */
const SAMPLE = 128;

/**
 * @param spacings m, coarse to fine; each map is made when it is asked for
 * @param tolerances as of `SurfacePotentials.map`
 */
export function* progressiveMaps(
  potentials: SurfacePotentials,
  box: Box,
  spacings: readonly number[],
  tolerances: readonly number[],
): Generator<ProgressiveMap, void> {
  for (const spacing of spacings) {
    const map = potentials.map(box, spacing, tolerances);
    yield { ...map, spacing, between: missedBetween(map) };
  }
}

/** Compares at the middles of cells strewn evenly over the map, where interpolation is at its worst. */
function missedBetween({ lattices, potential }: SurfaceMap): number[] {
  return lattices.map((lattice, u) => {
    const { nx, ny, x0, y0, spacing } = lattice;
    const cells = (nx - 1) * (ny - 1);
    const exact = potential(u);
    const golden = (Math.sqrt(5) - 1) / 2;
    let most = 0;
    for (let k = 0; k < Math.min(SAMPLE, cells); k++) {
      const cell = Math.floor(((k * golden) % 1) * cells);
      const x = x0 + ((cell % (nx - 1)) + 0.5) * spacing;
      const y = y0 + (Math.floor(cell / (nx - 1)) + 0.5) * spacing;
      most = Math.max(most, Math.abs(latticeValue(lattice, x, y) - exact(x, y)));
    }
    return most;
  });
}
