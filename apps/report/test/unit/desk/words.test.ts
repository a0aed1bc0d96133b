// Places, values and edits in words.
import { describe, expect, test } from 'vitest';
import { conductorsLabel, conductorsWords, moveLabel, setLabel } from '../../../src/desk/labels.ts';
import type { JsonPath } from '../../../src/desk/path.ts';
import { kindOfPath } from '../../../src/desk/path-kind.ts';
import { pathWords, valueWords } from '../../../src/desk/path-words.ts';
import { demo } from './drafts.ts';

const draft = demo('aldermoor');
const wire = { id: 'EW-01', x1: 0, y1: 0, depth1: 0.5, x2: 9, y2: 0, depth2: 0.5, diameter: 0.01 };
const rod = { ...wire, id: 'R-03', x2: 0, depth2: 3.5 };

test.each<[JsonPath, string]>([
  [['title'], 'title'],
  [['soil', 'layers', 0, 'resistivity_ohm_m'], 'soil resistivity of layer 1'],
  [['soil', 'layers', 1], 'layer 2'],
  [['soil', 'layers'], 'list of soil layers'],
  [['cases', 0, 'fault_current_A'], 'fault current of case 33 kV busbar'],
  [['cases', 9, 'duration_s'], 'fault duration of case 10'],
  [['cases', 0, 'inject', 'x_m'], 'x of the injection of case 33 kV busbar'],
  [['seasons', 0, 'layers', 1, 'thickness_m'], 'layer thickness of layer 2 of season 1'],
  [['electrodes', 1, 'role'], 'electrode role of electrode fence'],
  [['surfacing', 'thickness_m'], 'covering thickness'],
  [['surfacing', 'areas', 0, 2, 1], 'y of corner 3 of area of the covering 1'],
  [['areas', 'touch', 0, 2], 'corner 3 of touch area 1'],
  [['notes', 'ground'], 'note on the ground'],
  [['colour', 'x'], 'colour.x'],
])('%j is %s', (path, words) => {
  expect(pathWords(draft.study, path)).toBe(words);
});

test('every number of the demonstration study has its kind', () => {
  expect(kindOfPath(['surfacing', 'thickness_m'])).toBe('thickness');
  expect(kindOfPath(['soil', 'layers', 0, 'thickness_m'])).toBe('length');
  expect(kindOfPath(['areas', 'touch', 0, 1, 0])).toBe('coordinate');
  expect(kindOfPath(['cases', 0, 'x_over_r'])).toBe('ratio');
  expect(kindOfPath(['version'])).toBeUndefined();
  expect(kindOfPath(['cases', 0])).toBeUndefined();
  expect(kindOfPath([])).toBeUndefined();
});

test('values have their units', () => {
  expect(valueWords(['surfacing', 'thickness_m'], 0.1016, 'US')).toBe('4\u202fin');
  expect(valueWords(['title'], 'Yard\n2')).toBe('Yard<U+000A>2');
  expect(valueWords(['cases'], [{}])).toBe('1 item');
  expect(valueWords(['soil'], {})).toBe('given');
  expect(valueWords(['soil'], undefined)).toBe('nothing');
});

describe('edits', () => {
  test('of values', () => {
    const rho: JsonPath = ['soil', 'layers', 0, 'resistivity_ohm_m'];
    expect(setLabel(draft, rho, 180)).toBe('soil resistivity of layer 1: 220\u202fΩ·m → 180\u202fΩ·m');
    expect(setLabel(draft, ['project', 'client'], 'N.')).toBe('client set to N.');
    expect(setLabel(draft, ['cases', 2], undefined)).toBe('case 11 kV feeder removed');
    expect(setLabel(draft, ['soil'], { layers: [] })).toBe('soil changed');
  });

  test('of conductors', () => {
    expect(moveLabel([rod], { dx: 2, dy: 0 })).toBe('rod R-03 moved 2\u202fm east');
    expect(moveLabel([rod, rod, wire], { dx: -0.5, dy: 1e-9, ddepth: 0.1 })).toBe(
      '1 conductor and 2 rods moved 0.5\u202fm west and 0.1\u202fm deeper',
    );
    expect(moveLabel([wire], { dx: 0, dy: -0.3048, ddepth: -0.1524 }, 'US')).toBe(
      'conductor EW-01 moved 1\u202fft south and 0.5\u202fft higher',
    );
    expect(moveLabel([wire], { dx: 1e-5, dy: 0 })).toBe('conductor EW-01 moved by less than a millimetre');
    expect(conductorsWords([{ ...rod, id: undefined }])).toBe('rod');
    expect(conductorsLabel([wire, wire], 'deleted')).toBe('2 conductors deleted');
  });
});
