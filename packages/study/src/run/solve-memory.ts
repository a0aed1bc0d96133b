// What one computation leaves for the next of an edited study: image lists of a soil, and leakage matrices of its meshes.
import {
  type Crew,
  type KnownLeakage,
  type LeakageMatrix,
  leakageOperator,
  reusedLeakageMatrix,
  type SegmentMesh,
  type SoilImages,
  type SoilModel,
  soilImages,
} from '@ohmstead/core';
import type { LoadedStudy } from '../study.ts';
import { type Ground, groundOf } from './ground-of.ts';

export interface SolveMemory {
  /** layers of a study, fitted once where its soil is a survey */
  readonly ground: (loaded: LoadedStudy) => Ground;
  /** lists of a soil, made once */
  readonly images: (soil: SoilModel) => SoilImages;
  /** the matrix of a mesh; entries between segments that the last one of this level had too are taken from it */
  readonly matrix: (
    mesh: SegmentMesh,
    images: SoilImages,
    level: number,
    crew?: Crew,
  ) => Promise<LeakageMatrix>;
}

/** Soils whose lists are kept. Reason: the study's own and a few seasons, while one of them is edited. */
const KEPT_SOILS = 6;
/** Levels of one soil whose matrices are kept: 3000 segments whole take 36 MB. */
const KEPT_MATRICES = 6;

/** Keeps nothing: every number is computed anew. */
export const noMemory: SolveMemory = {
  ground: groundOf,
  images: (soil) => soilImages(soil),
  matrix: (mesh, images, _, crew) => leakageOperator(mesh, images, crew),
};

/**
 * A memory that lasts from one computation to the next. Entries that are taken over differ from new ones by 1e-7 of
 * themselves at most, far below the stated uncertainty, but not by nothing: what is recorded is computed without it.
 */
export function solveMemory(): SolveMemory {
  const soils = new Map<string, SoilImages>();
  const matrices = new Map<string, KnownLeakage>();
  const grounds = new Map<string, Ground>();
  return {
    ground(loaded) {
      const key = JSON.stringify([loaded.study.soil, loaded.survey]);
      const known = grounds.get(key) ?? groundOf(loaded);
      keep(grounds, key, known, 1);
      return known;
    },
    images(soil) {
      const key = JSON.stringify(soil);
      const known = soils.get(key) ?? soilImages(soil);
      keep(soils, key, known, KEPT_SOILS);
      return known;
    },
    async matrix(mesh, images, level, crew) {
      const key = [...soils].find(([, kept]) => kept === images)?.[0];
      if (key === undefined) return leakageOperator(mesh, images, crew);
      const place = `${level} ${key}`;
      const before = matrices.get(place);
      const matrix = await (before === undefined
        ? leakageOperator(mesh, images, crew)
        : reusedOperator(before, mesh, crew));
      if (isWhole(matrix)) keep(matrices, place, { mesh, images, matrix }, KEPT_MATRICES);
      else matrices.delete(place);
      return matrix;
    },
  };
}

function isWhole(matrix: LeakageMatrix): matrix is KnownLeakage['matrix'] {
  return matrix.entries !== undefined;
}

/** Only where the new mesh would be stored whole too. */
async function reusedOperator(before: KnownLeakage, mesh: SegmentMesh, crew?: Crew): Promise<LeakageMatrix> {
  const fits = mesh.count <= MOST_GROWTH * before.mesh.count;
  return fits ? reusedLeakageMatrix(before, mesh).matrix : leakageOperator(mesh, before.images, crew);
}

/** A mesh that grew by more than this has little in common with the one before. */
const MOST_GROWTH = 1.5;

/** Puts a value last and drops the oldest past so many. */
function keep<T>(map: Map<string, T>, key: string, value: T, most: number): void {
  map.delete(key);
  map.set(key, value);
  const [oldest] = map.keys();
  if (map.size > most && oldest !== undefined) map.delete(oldest);
}
