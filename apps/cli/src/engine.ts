// The computing that commands call, in one place, so that tests can put a quick one in its stead.
import { freemem } from 'node:os';
import type { Crew } from '@ohmstead/core';
import type { PageScripts, Renderer } from '@ohmstead/pack';
import {
  type FieldPoint,
  type FieldValue,
  fieldAt,
  fitSurvey,
  type LoadedStudy,
  type LoadedSurvey,
  loadPoints,
  loadStudy,
  loadSurvey,
  type Outcome,
  type PointTable,
  programVersion,
  type SoilFit,
  type StudySource,
  type SurveyFile,
  solveStudy,
} from '@ohmstead/study';

export interface Engine {
  readonly loadStudy: (source: StudySource) => LoadedStudy;
  readonly loadPoints: (source: StudySource, path: string) => PointTable;
  readonly loadSurvey: (source: StudySource, path: string) => SurveyFile;
  readonly fitSurvey: (survey: LoadedSurvey, layerCount: number | 'auto') => { readonly fit: SoilFit };
  readonly solveStudy: (
    loaded: LoadedStudy,
    options?: { readonly onProgress?: (stage: string, share: number) => void },
  ) => Promise<Outcome>;
  readonly fieldAt: (
    loaded: LoadedStudy,
    points: readonly FieldPoint[],
    caseName: string,
    onProgress: (stage: string, share: number) => void,
  ) => Promise<readonly FieldValue[]>;
  /** what packs are drawn with; the sheet's own where left out */
  readonly renderer?: Renderer;
  /** what the sheets of packs carry to be computed anew; nothing where left out */
  readonly pageScripts?: () => Promise<PageScripts>;
  readonly version: string;
}

/** Of the memory that is free; the rest is left to the machine. */
const MEMORY_SHARE = 0.8;

/** @param crew shares in large work, and is ended with it */
export function engineWith(crew?: Crew): Engine {
  const ending = async <T>(work: Promise<T>): Promise<T> => {
    try {
      return await work;
    } finally {
      crew?.end();
    }
  };
  return {
    loadStudy,
    loadPoints,
    loadSurvey,
    fitSurvey,
    solveStudy: (loaded, options) =>
      ending(solveStudy(loaded, { ...options, crew, memoryBytes: MEMORY_SHARE * freemem() })),
    fieldAt: (loaded, points, caseName, onProgress) =>
      ending(fieldAt(loaded, points, caseName, onProgress, crew)),
    // read only when wanted: it is as large as the program itself
    pageScripts: async () => (await import('./page-scripts.ts')).pageScripts,
    version: programVersion,
  };
}
