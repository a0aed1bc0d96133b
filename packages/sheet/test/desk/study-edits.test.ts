// Edits of the lists of a study: nothing is invented, nothing that was stated is lost.
import { describe, expect, it } from 'vitest';
import {
  casesWithOneMore,
  caseWithSource,
  currentSourceOf,
  draftIndex,
  layersWithOneMore,
  layersWithout,
  listWithout,
  seasonKindOf,
  seasonOfKind,
  seasonsWithOneMore,
  solvedIndex,
} from '../../src/desk/study-edits.ts';
import { pathText, sectionOfInput } from '../../src/desk/study-path.ts';

const layers = [{ resistivity_ohm_m: 220, thickness_m: 2.4 }, { resistivity_ohm_m: 65 }];

describe('layers', () => {
  it('are added below of the same resistivity, so that the ground is the same until one is changed', () => {
    expect(layersWithOneMore(layers)).toEqual([
      layers[0],
      { resistivity_ohm_m: 65, thickness_m: 2.4 },
      { resistivity_ohm_m: 65 },
    ]);
    expect(layersWithOneMore([{ resistivity_ohm_m: 65 }])).toEqual([
      { resistivity_ohm_m: 65, thickness_m: 1 },
      { resistivity_ohm_m: 65 },
    ]);
    expect(layersWithOneMore(undefined)).toEqual([{}]);
  });

  it('are removed so that the last reaches to any depth', () => {
    expect(layersWithout(layers, 1)).toEqual([{ resistivity_ohm_m: 220 }]);
    expect(layersWithout(layers, 0)).toEqual([{ resistivity_ohm_m: 65 }]);
  });
});

describe('cases', () => {
  it('are added under a name that is free', () => {
    expect(casesWithOneMore([{ name: 'bus' }, { name: 'case 3' }])[2]).toEqual({ name: 'case 4' });
  });

  it('change how their current is stated, to the same current', () => {
    const stated = { name: 'bus', fault_current_A: 6300, division_factor: 0.5, duration_s: 0.4 };
    const grid = caseWithSource(stated, 'grid');
    expect(grid).toEqual({ name: 'bus', duration_s: 0.4, grid_current_A: 3150 });
    expect(currentSourceOf(grid)).toBe('grid');
    expect(caseWithSource(grid, 'fault')).toEqual({
      name: 'bus',
      duration_s: 0.4,
      fault_current_A: 3150,
      division_factor: 1,
    });
  });

  it('without a current stay to be filled in', () => {
    const grid = caseWithSource({ name: 'bus' }, 'grid');
    expect(grid).toEqual({ name: 'bus', grid_current_A: null });
    expect(currentSourceOf(grid)).toBe('grid');
    expect(caseWithSource(grid, 'fault')).toEqual({ name: 'bus' });
  });

  it('keep what was solved of them, by place while none came or went, by name after', () => {
    const solved = [{ name: 'a' }, { name: 'b' }];
    expect(solvedIndex([{ name: 'a' }, { name: 'renamed' }], 1, solved)).toBe(1);
    expect(solvedIndex([{ name: 'b' }], 0, solved)).toBe(1);
    expect(solvedIndex([{ name: 'a' }, { name: 'b' }, { name: 'new' }], 2, solved)).toBeUndefined();
    expect(draftIndex([{ name: 'b' }], 1, solved)).toBe(0);
    expect(draftIndex([{ name: 'b' }], 0, solved)).toBeUndefined();
  });
});

describe('seasons', () => {
  it('are added with a change to be filled in, and the key goes with the last', () => {
    expect(seasonsWithOneMore(undefined)).toEqual([{ name: 'season 1', top: {} }]);
    expect(listWithout([{ name: 'dry' }], 0)).toBeUndefined();
  });

  it('change their kind and keep what it shares', () => {
    const dry = { name: 'dry', top: { depth_m: 1, resistivity_ohm_m: 900 } };
    expect(seasonKindOf(dry)).toBe('top');
    const both = seasonOfKind(dry, 'both', layers);
    expect(both).toEqual({ ...dry, below: {} });
    expect(seasonKindOf(both)).toBe('both');
    expect(seasonOfKind(both, 'below', layers)).toEqual({ name: 'dry', below: {} });
    expect(seasonOfKind(dry, 'layers', layers)).toEqual({ name: 'dry', layers });
    expect(seasonKindOf({ name: 'x', layers: [] })).toBe('layers');
  });
});

describe('places of a study', () => {
  it('are written as faults write them', () => {
    expect(pathText(['soil', 'layers', 0, 'resistivity_ohm_m'])).toBe('soil.layers[0].resistivity_ohm_m');
  });

  it('belong to the section that shows them', () => {
    expect(sectionOfInput(['surfacing', 'thickness_m'])).toBe('ground');
    expect(sectionOfInput(['cases', 0, 'duration_s'])).toBe('fault');
    expect(sectionOfInput(['title'])).toBeUndefined();
    expect(sectionOfInput([])).toBeUndefined();
  });
});
