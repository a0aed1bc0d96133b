import { loadStudy, type Outcome, sourceFromMap } from '@ohmstead/study';
import { describe, expect, it } from 'vitest';
import type { Draft } from '../../../src/desk/draft.ts';
import { setValue } from '../../../src/desk/set-value.ts';
import { type Bench, beginBench, isComplete, reduceBench, sectionState } from '../../../src/view/bench.ts';
import { demo } from '../desk/drafts.ts';

const draft = demo('square-70m');

/** An outcome of a draft, of which nothing but its study is looked at here. */
function outcomeOf({ files }: Draft): Outcome {
  const { study } = loadStudy(sourceFromMap(files));
  return { study, results: {} } as unknown as Outcome;
}

function ran(bench: Bench, run: number, kind: 'first' | 'solved'): Bench {
  const now = bench.history.present.draft;
  const began = reduceBench(bench, { kind: 'began', run, draft: now });
  return reduceBench(began, { kind: 'answer', answer: { kind, run, outcome: outcomeOf(now) } });
}

const solved = ran(beginBench(draft, 'opened'), 1, 'solved');
const edited = (next: Draft): Bench => reduceBench(solved, { kind: 'edit', draft: next, label: 'edited' });

describe('results while a newer run is under way', () => {
  it('give way to an early outcome where they are out of date', () => {
    const bench = ran(edited(setValue(draft, ['soil', 'layers', 0, 'resistivity_ohm_m'], 90)), 2, 'first');
    expect(bench.solved).toMatchObject({ run: 2, early: true });
  });
  it('are told to be the first while finer meshes still move them', () => {
    const bench = ran(edited(setValue(draft, ['soil', 'layers', 0, 'resistivity_ohm_m'], 90)), 2, 'first');
    const states = (['ground', 'rise', 'people', 'season'] as const).map((id) => sectionState(bench, id));
    expect(states).toEqual(['fresh', 'early', 'early', 'computing']);
    expect(sectionState(solved, 'rise')).toBe('fresh');
  });
  it('stand where words alone were edited', () => {
    const bench = ran(edited(setValue(draft, ['notes', 'ground'], 'dry')), 2, 'first');
    expect(bench.solved).toMatchObject({ run: 1, early: false });
  });
});

describe('a complete outcome', () => {
  it('is of the draft as it stands, its words included', () => {
    expect(isComplete(solved)).toBe(true);
    const noted = edited(setValue(draft, ['notes', 'ground'], 'dry'));
    expect(isComplete(noted)).toBe(false);
    expect(isComplete(ran(noted, 2, 'solved'))).toBe(true);
  });
});

describe('the faults that are told', () => {
  it('leave out what is asked for, and nothing else', () => {
    const wrong = setValue(draft, ['soil', 'layers', 0, 'resistivity_ohm_m'], 0);
    const lacking = setValue(wrong, ['cases', 1], { name: 'second' });
    const bench = reduceBench(edited(lacking), { kind: 'began', run: 2, draft: lacking });
    const fault = (place: string) => ({ file: 'study.json', place, code: 'x', message: 'x' });
    const faults = ['cases[1]', 'cases[1].duration_s', 'soil.layers[0].resistivity_ohm_m'].map(fault);
    const told = reduceBench(bench, { kind: 'answer', answer: { kind: 'faults', run: 2, faults } });
    expect(told.faults.map(({ place }) => place)).toEqual(['soil.layers[0].resistivity_ohm_m']);
  });
});
