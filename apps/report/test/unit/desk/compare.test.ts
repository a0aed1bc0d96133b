// States pinned and compared: what differs is told, and nothing else.
import { type Outcome, solveStudy } from '@ohmstead/study';
import { beforeAll, describe, expect, test } from 'vitest';
import { compareStates } from '../../../src/desk/compare.ts';
import { conductorDifferences } from '../../../src/desk/compare-conductors.ts';
import { inputDifferences } from '../../../src/desk/compare-inputs.ts';
import {
  addConductors,
  deleteConductors,
  moveConductors,
  setConductor,
} from '../../../src/desk/conductor-edits.ts';
import { type Difference, isTold } from '../../../src/desk/difference.ts';
import type { Draft } from '../../../src/desk/draft.ts';
import { addPin, MOST_PINS, type Pin, removePin, renamePin, stateOf } from '../../../src/desk/pins.ts';
import { planQuantities } from '../../../src/desk/plan-quantities.ts';
import { copyItem, setValue } from '../../../src/desk/set-value.ts';
import { demo, loaded, small } from './drafts.ts';

const FILE = 'conductors.csv';

async function solved(draft: Draft, name = 'state'): Promise<Pin> {
  return stateOf(name, draft, await solveStudy(loaded(draft)));
}

function words(lines: readonly Difference[]): readonly string[] {
  return lines.map(({ what, before, after }) => `${what}: ${before} → ${after}`);
}

describe('inputs', () => {
  const before = demo('aldermoor');

  test('are the same where nothing was changed, whatever the order of the keys', () => {
    const turned = Object.fromEntries(Object.entries(before.study).toReversed());
    expect(inputDifferences(before.study, turned)).toEqual([]);
  });

  test('are told value by value, in words', () => {
    let after = setValue(before, ['soil', 'layers', 0, 'resistivity_ohm_m'], 180);
    after = setValue(after, ['project', 'client'], 'N.');
    after = setValue(
      after,
      ['surfacing', 'areas', 0],
      [
        [0, 0],
        [8, 0],
        [8, 8],
        [0, 8],
      ],
    );
    after = setValue(after, ['cases', 2, 'x_over_r'], undefined);
    expect(words(inputDifferences(before.study, after.study))).toEqual([
      'client: undefined → N.',
      'soil resistivity of layer 1: 220 → 180',
      'area of the covering 1: 6 corners, 2862 m² → 4 corners, 64 m²',
      'X/R ratio of case 11 kV feeder: 3 → undefined',
    ]);
  });

  test('cases are met by their names: one removed before others changes nothing of them', () => {
    const after = setValue(before, ['cases', 0], undefined);
    expect(
      inputDifferences(before.study, after.study).every(({ what }) => what.endsWith('of case 33 kV busbar')),
    ).toBe(true);
    const more = copyItem(before, ['cases'], 0);
    expect(
      inputDifferences(before.study, more.study).every(({ what }) => what.endsWith('of case 33 kV busbar 2')),
    ).toBe(true);
  });

  test('an outline of the same size elsewhere is moved', () => {
    const areas = (x: number): Draft =>
      setValue(
        before,
        ['areas', 'step'],
        [
          [
            [x, 0],
            [x + 2, 0],
            [x + 2, 2],
          ],
        ],
      );
    expect(words(inputDifferences(areas(0).study, areas(5).study))).toEqual([
      'step area 1: 3 corners, 2 m² → 3 corners, 2 m², moved',
    ]);
  });
});

describe('solved states', () => {
  let outcome: Outcome;
  let start: Pin;
  beforeAll(async () => {
    start = await solved(small(), 'before');
    if (start.outcome === undefined) throw new Error('a solved state has its outcome');
    outcome = start.outcome;
  });

  test('a state is the same as itself, and as the same study solved again', async () => {
    const nothing = {
      inputs: [],
      conductors: { added: [], removed: [], moved: [], remade: [] },
      metal: [],
      results: [],
    };
    expect(compareStates(start, start)).toEqual(nothing);
    expect(compareStates(start, await solved(small()))).toEqual(nothing);
  });

  test('a rod added is told in metal and results, beyond their uncertainty', async () => {
    const rod = {
      id: 'R',
      x1: 0,
      y1: 0,
      depth1: 0.5,
      x2: 0,
      y2: 0,
      depth2: 6.5,
      diameter: 0.016,
      material: 'steel-1020',
    };
    const after = await solved(addConductors(small(), [rod]).draft);
    const { inputs, conductors, metal, results } = compareStates(start, after);
    expect(inputs).toEqual([]);
    expect(conductors.added.map(({ id }) => id)).toEqual(['R']);
    expect(words(metal)).toEqual([
      'rods of steel-1020, 16\u202fmm: 0 → 1',
      'length of rods of steel-1020, 16\u202fmm: 0 → 6',
    ]);
    const [resistance, rise] = results;
    expect([resistance?.what, rise?.what]).toEqual(['resistance', 'ground potential rise of bus']);
    expect(Number(resistance?.after)).toBeLessThan(Number(resistance?.before));
    expect(resistance !== undefined && isTold(resistance)).toBe(true);
    expect(words(compareStates(after, start).metal)[0]).toBe('rods of steel-1020, 16\u202fmm: 1 → 0');
  });

  test('results are told by case, with the share of the limit and what governs', async () => {
    const doubled = await solved(setValue(small(), ['cases', 0, 'grid_current_A'], 2000));
    const { results } = compareStates(start, doubled);
    const touch = start.results.cases[0]!.touch;
    const share = results.find(({ what }) => what === 'touch voltage of bus, share of its limit');
    expect(share?.before).toBe((100 * touch.worst_V) / touch.limit_V);
    // in a linear system voltages double with the current
    expect(Number(share?.after) / Number(share?.before)).toBeCloseTo(2, 9);
    expect(results.map(({ what }) => what)).toEqual([
      'grid current of bus',
      'ground potential rise of bus',
      'worst touch voltage of bus',
      'touch voltage of bus, share of its limit',
      'worst step voltage of bus',
      'step voltage of bus, share of its limit',
      'narrowest margin',
    ]);
  });

  test('over seasons the worst of them is compared, and the season told', async () => {
    const season = { name: 'dry', layers: [{ resistivity_ohm_m: 200 }] };
    const after = await solved(setValue(small(), ['seasons'], [season]));
    const { results } = compareStates(start, after);
    const envelope = after.results.envelope[0]!;
    expect(results.find(({ what }) => what === 'worst touch voltage of bus')?.after).toBe(
      envelope.touch.worst_V,
    );
    expect(String(results.find(({ what }) => what === 'what governs')?.after)).toMatch(
      /^(touch|step) voltage of bus at \(-?\d+\.\d, -?\d+\.\d\) m, (dry|as given)$/,
    );
  });

  test('metal is summed by diameter and material', () => {
    expect(planQuantities(outcome.plan.conductors)).toEqual({
      conductors: [{ diameter: 0.01, material: 'copper-annealed', count: 4, length: 40 }],
      rods: [],
    });
  });
});

describe('conductors', () => {
  const plan = (draft: Draft): Parameters<typeof conductorDifferences>[0] => {
    const { conductors: t } = loaded(draft);
    return t.id.map((id, i) => ({
      ...{
        id,
        x1: t.x1[i]!,
        y1: t.y1[i]!,
        depth1: t.depth1[i]!,
        x2: t.x2[i]!,
        y2: t.y2[i]!,
        depth2: t.depth2[i]!,
      },
      ...{ diameter: 2 * t.radius[i]!, material: t.material[i]!, electrode: t.electrode[i]! },
      ...{ role: 'energised' as const, insulated: false, rod: false },
    }));
  };
  const row = (line: number): { file: string; line: number } => ({ file: FILE, line });
  const names = (draft: Draft): object => {
    const { added, removed, moved, remade } = conductorDifferences(plan(small()), plan(draft));
    return {
      added: added.map(({ id }) => id),
      removed: removed.map(({ id }) => id),
      moved: moved.map(({ after }) => after.id),
      remade: remade.map(({ after }) => after.id),
    };
  };

  test('are moved, remade, added or removed', () => {
    const none = { added: [], removed: [], moved: [], remade: [] };
    expect(names(small())).toEqual(none);
    expect(names(moveConductors(small(), [row(2)], { dx: 1, dy: 0 }))).toEqual({ ...none, moved: ['A'] });
    expect(names(setConductor(small(), row(3), { diameter: 0.02 }))).toEqual({ ...none, remade: ['B'] });
    expect(names(deleteConductors(small(), [row(4)]))).toEqual({ ...none, removed: ['C'] });
    const wire = { id: 'E', x1: 0, y1: 5, depth1: 0.5, x2: 10, y2: 5, depth2: 0.5, diameter: 0.01 };
    expect(names(addConductors(small(), [wire]).draft)).toEqual({ ...none, added: ['E'] });
  });

  test('without ids are met by their places: one deleted leaves the others alone', () => {
    const bare =
      'x1_m,y1_m,depth1_m,x2_m,y2_m,depth2_m,diameter_mm\n0,0,1,9,0,1,10\n9,0,1,9,9,1,10\n9,9,1,0,0,1,10\n';
    const before = small(undefined, bare);
    const { added, removed, moved } = conductorDifferences(
      plan(before),
      plan(deleteConductors(before, [row(2)])),
    );
    expect([added, removed.map(({ id }) => id), moved]).toEqual([[], ['1'], []]);
  });

  test('drawn the other way round are the same', () => {
    const turned = setConductor(small(), row(2), { x1: 10, x2: 0 });
    expect(names(turned)).toEqual({ added: [], removed: [], moved: [], remade: [] });
  });
});

describe('pins', () => {
  const pin = (name: string): Pin => ({
    name,
    draft: small(),
    results: JSON.parse('{}'),
    conductors: [],
  });

  test('each have a name of their own', () => {
    const pins = addPin(addPin(addPin([], pin('wet')), pin('wet')), pin(' '));
    expect(pins.map(({ name }) => name)).toEqual(['wet', 'wet 2', 'state']);
    expect(renamePin(pins, 1, ' state ').map(({ name }) => name)).toEqual(['wet', 'state 2', 'state']);
    expect(renamePin(pins, 0, 'wet').map(({ name }) => name)).toEqual(['wet', 'wet 2', 'state']);
    expect(renamePin(pins, 0, ' ')).toBe(pins);
    expect(removePin(pins, 0).map(({ name }) => name)).toEqual(['wet 2', 'state']);
  });

  test('are no more than can be read', () => {
    let pins: readonly Pin[] = [];
    for (let i = 0; i <= MOST_PINS; i++) pins = addPin(pins, pin('a'));
    expect(pins).toHaveLength(MOST_PINS);
  });
});
