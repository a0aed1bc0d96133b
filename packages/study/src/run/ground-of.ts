// The soil a study is solved in: its layers, or what its field readings make of them.
import type { FamilyMember, SoilModel } from '@ohmstead/core';
import type { SoilFit } from '../ground.ts';
import type { LoadedStudy } from '../study.ts';
import { layeredSoil } from './prepare.ts';
import { fitSurvey } from './survey-fit.ts';

export interface Ground {
  readonly soil: SoilModel;
  /** where the soil was fitted */
  readonly fitted?: { readonly fit: SoilFit; readonly members: readonly FamilyMember[] };
}

/** @throws InputFaults where the readings allow no fit */
export function groundOf(loaded: LoadedStudy): Ground {
  const { soil } = loaded.study;
  if (soil.layers !== undefined) return { soil: layeredSoil(soil.layers) };
  if (loaded.survey === undefined) throw new Error('a study whose soil is a survey was loaded without it');
  const { fit, members, model } = fitSurvey(loaded.survey, soil.layer_count);
  return { soil: model, fitted: { fit, members } };
}
