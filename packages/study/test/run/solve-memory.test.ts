import { describe, expect, it } from 'vitest';
import { type Bar, gridBars, rodBar } from '../../../core/test/support/electrodes.ts';
import { type Results, solveMemory, solveStudy } from '../../src/index.ts';
import { studyOf } from '../support/studies.ts';

const grid = gridBars(20, 20, 4, 4, 0.5, 0.005);
const layers = [[100, 2], [300]] as const; // biome-ignore format: two layers
const rodAt = (x: number): Bar[] => [...grid, rodBar(x, 0, 0.5, 3.5, 0.008)];

/** Same shape, numbers within a share of each other. */
function expectClose(a: unknown, b: unknown, share: number, path = ''): void {
  if (typeof a === 'number' && typeof b === 'number')
    expect(Math.abs(a - b), path).toBeLessThanOrEqual(share * Math.max(Math.abs(a), Math.abs(b), 1e-6));
  else if (typeof a === 'object' && a !== null && typeof b === 'object' && b !== null) {
    const [left, right] = [new Map(Object.entries(a)), new Map(Object.entries(b))];
    expect([...left.keys()], path).toEqual([...right.keys()]);
    for (const [key, value] of left) expectClose(value, right.get(key), share, `${path}.${key}`);
  } else expect(a, path).toBe(b);
}

const withoutChecks = ({ checks: _, mesh: __, ...kept }: Results): unknown => kept;

describe('what a computation leaves for the next', async () => {
  const memory = solveMemory();
  const first = await solveStudy(studyOf(rodAt(0), layers), { memory });

  it('changes nothing in the first', async () => {
    const alone = await solveStudy(studyOf(rodAt(0), layers));
    expect(JSON.stringify(first.results)).toBe(JSON.stringify(alone.results));
  });

  it('gives a moved rod the results of a fresh computation, to 1e-6', async () => {
    const edited = await solveStudy(studyOf(rodAt(10), layers), { memory });
    const fresh = await solveStudy(studyOf(rodAt(10), layers));
    expect(edited.results.electrode.resistance_ohm).not.toBe(first.results.electrode.resistance_ohm);
    expectClose(withoutChecks(edited.results), withoutChecks(fresh.results), 1e-6);
  });

  it('does not carry over to another soil', async () => {
    const other = [[70, 1], [500]] as const; // biome-ignore format: two layers
    const edited = await solveStudy(studyOf(rodAt(10), other), { memory });
    const fresh = await solveStudy(studyOf(rodAt(10), other));
    expect(JSON.stringify(edited.results)).toBe(JSON.stringify(fresh.results));
  });

  it('keeps the lists of a soil', () => {
    const soil = { layers: [{ resistivity: 100, thickness: Number.POSITIVE_INFINITY }] };
    expect(memory.images(soil)).toBe(memory.images(structuredClone(soil)));
  });
});
