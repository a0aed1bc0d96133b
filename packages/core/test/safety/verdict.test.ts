// Verdicts on voltages with their uncertainty.
import { describe, expect, test } from 'vitest';
import { judge } from '../../src/safety/verdict.ts';

describe('verdict', () => {
  test('within the limit by a margin', () => {
    expect(judge(630, 10, 840)).toEqual({ outcome: 'within', withinLimit: true, marginPercent: 25 });
  });

  test('beyond the limit by a negative margin', () => {
    expect(judge(1050, 10, 840)).toEqual({ outcome: 'beyond', withinLimit: false, marginPercent: -25 });
  });

  test('undecided where the limit lies within the uncertainty, on either side', () => {
    expect(judge(835, 5.1, 840)).toMatchObject({ outcome: 'undecided', withinLimit: true });
    expect(judge(845, 5.1, 840)).toMatchObject({ outcome: 'undecided', withinLimit: false });
    expect(judge(835, 5, 840).outcome).toBe('within');
    expect(judge(845, 5, 840).outcome).toBe('beyond');
  });

  test('a voltage at its limit is within it', () => {
    expect(judge(840, 0, 840)).toEqual({ outcome: 'within', withinLimit: true, marginPercent: 0 });
    expect(judge(0.5, 0.2, 0.5)).toMatchObject({ outcome: 'undecided', withinLimit: true });
    expect(judge(0, 0, 0.5)).toEqual({ outcome: 'within', withinLimit: true, marginPercent: 100 });
  });

  test('numbers from which no verdict can be had are refused', () => {
    expect(() => judge(1, 0, 0)).toThrow('limit: 0 V is not a positive voltage');
    expect(() => judge(Number.NaN, 0, 840)).toThrow('worst voltage: NaN V is not a magnitude');
    expect(() => judge(1, -1, 840)).toThrow('uncertainty: -1 V is not a magnitude');
  });
});
