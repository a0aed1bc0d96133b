// Seasons of study.json: what a season may be, beside the broken ones of the test data.
import { describe, expect, test } from 'vitest';
import { SOIL_AS_GIVEN } from '../../src/input/defaults.ts';
import { loadStudy } from '../../src/input/load-study.ts';
import { AS_GIVEN } from '../../src/run/seasons.ts';
import { memorySource, smallStudy, studyFaultLines } from './folder-source.ts';

const dry = { depth_m: 0.5, resistivity_ohm_m: 900 };
const wet = { depth_m: 1.5, resistivity_ohm_m: 40 };

describe('seasons', () => {
  test.each([
    [{ name: 'dry', top: dry }],
    [{ name: 'wet', below: wet }],
    [{ name: 'dry over wet', top: dry, below: wet }],
    [{ name: 'all else', layers: [{ resistivity_ohm_m: 50, thickness_m: 1 }, { resistivity_ohm_m: 9 }] }],
  ])('%j', (season) => {
    const { study } = loadStudy(memorySource({ ...smallStudy, seasons: [season] }));
    expect(study.seasons).toEqual([season]);
  });

  test('may be none', () => {
    expect(studyFaultLines(memorySource({ ...smallStudy, seasons: [] }))).toEqual([]);
  });

  test('are refused where the wet ground begins with the bottom of the top', () => {
    const season = { name: 'both', top: { ...dry, depth_m: 1.5 }, below: wet };
    expect(studyFaultLines(memorySource({ ...smallStudy, seasons: [season] }))).toEqual([
      expect.stringContaining('depth 1.5 m of what is wet below is not deeper than the top, 1.5 m'),
    ]);
  });

  test('are refused where they are more than the months', () => {
    const seasons = Array.from({ length: 13 }, (_, i) => ({ name: `month ${i}`, top: dry }));
    expect(studyFaultLines(memorySource({ ...smallStudy, seasons }))).toEqual([
      expect.stringContaining(
        'seasons: list of seasons has 13 items; expected at most 12 seasons, each an object with name and layers, top or below',
      ),
    ]);
  });

  test('the name that is kept is the one that results give the soil of the study', () => {
    expect(SOIL_AS_GIVEN).toBe(AS_GIVEN);
  });
});
