import { expect, it } from 'vitest';
import { otherDoubts } from '../../src/verdict/doubts.ts';
import { fixtureOutcome } from '../fixture.ts';

it('tells a doubt of the fit once, though the results list it among the warnings too', () => {
  const { results } = fixtureOutcome();
  const own = { code: 'outliers', message: 'a reading stands off' };
  const other = { code: 'near-miss', message: 'an end stops short' };
  const merged = { ...results, ground: { fit: { doubts: [own] } }, warnings: [own, other] };
  expect(otherDoubts(merged)).toEqual([other]);
  expect(otherDoubts({ ...results, ground: null, warnings: [own, other] })).toEqual([own, other]);
});
