// Numbers of a study that may be tried: which, how they are named, and the study with some of them changed.
import { expect, test } from 'vitest';
import { numberInputs, typedNumber, withNumbers } from '../../../src/engine/starter/inputs.ts';

const study = {
  format: 'ohmstead-study',
  version: 1,
  soil: { layers: [{ resistivity_ohm_m: 220, thickness_m: 2.4 }, { resistivity_ohm_m: 65 }] },
  surfacing: {
    thickness_m: 0.1,
    areas: [
      [
        [-3, -3],
        [63, -3],
        [63, 27],
      ],
    ],
  },
  cases: [
    { name: 'bus', duration_s: 0.4, inject: { x_m: 43 } },
    { name: 'line', duration_s: 0.7 },
  ],
};

test('every number but the version and corners of areas, cases under their names', () => {
  expect(numberInputs(study)).toEqual([
    {
      name: 'soil.layers[0].resistivity_ohm_m',
      group: 'soil',
      label: 'layers[0].resistivity_ohm_m',
      value: 220,
    },
    { name: 'soil.layers[0].thickness_m', group: 'soil', label: 'layers[0].thickness_m', value: 2.4 },
    {
      name: 'soil.layers[1].resistivity_ohm_m',
      group: 'soil',
      label: 'layers[1].resistivity_ohm_m',
      value: 65,
    },
    { name: 'surfacing.thickness_m', group: 'surfacing', label: 'thickness_m', value: 0.1 },
    { name: 'cases[0].duration_s', group: 'bus', label: 'duration_s', value: 0.4 },
    { name: 'cases[0].inject.x_m', group: 'bus', label: 'inject.x_m', value: 43 },
    { name: 'cases[1].duration_s', group: 'line', label: 'duration_s', value: 0.7 },
  ]);
});

test('a changed study differs in the changed numbers alone, and the study itself not at all', () => {
  const before = structuredClone(study);
  const changed = withNumbers(
    study,
    new Map([
      ['cases[1].duration_s', 1],
      ['soil.layers[0].resistivity_ohm_m', 300],
    ]),
  );
  expect(study).toEqual(before);
  const due = structuredClone(study);
  due.cases[1]!.duration_s = 1;
  due.soil.layers[0]!.resistivity_ohm_m = 300;
  expect(changed).toEqual(due);
});

test.each([
  ['12.5', 12.5],
  [' 12,5 ', 12.5],
  ['−3', -3],
  ['1e3', 1000],
  ['', undefined],
  ['much', undefined],
  ['Infinity', undefined],
  ['1,2,3', undefined],
])('%j typed is %s', (text, value) => {
  expect(typedNumber(text)).toBe(value);
});
