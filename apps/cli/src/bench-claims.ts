// What the engine must show, what it could show at best, and whether this run showed it.
import { short } from './bench-table.ts';

export type Judgement = 'met' | 'not met' | 'not measured';

export interface Goal {
  readonly name: string;
  /** written after a figure, or before it where it is a power of n */
  readonly unit: '×' | ' s' | ' ms' | ' MB' | 'n^' | '';
  readonly sense: 'at least' | 'at most';
  readonly must: number;
  /** what the machine could give; absent where more would serve nobody */
  readonly stretch?: number;
}

export type GoalKey =
  | 'whole2000'
  | 'rows2000'
  | 'whole10000'
  | 'rows10000'
  | 'cholesky'
  | 'largestTime'
  | 'largestMemory'
  | 'growthMemory'
  | 'growthEvaluations'
  | 'growthIterations'
  | 'mapSmall'
  | 'mapLarge'
  | 'start'
  | 'resistance'
  | 'entries';

/** Goals on two cores, layered soil, warm; ratios are of rounds in one run. */
export const goals: Readonly<Record<GoalKey, Goal>> = {
  whole2000: faster('2 000 segments, against whole-array numpy', 25, 55),
  rows2000: faster('2 000 segments, against row-blocked numpy', 15, 35),
  whole10000: faster('10 000 segments, against whole-array numpy', 100, 300),
  rows10000: faster('10 000 segments, against row-blocked numpy', 40, 120),
  cholesky: faster('packed Cholesky, against ml-matrix Cholesky, 2 000 rows', 40, 65),
  largestTime: atMost('50 000 segments: assemble and solve', ' s', 5, 1.5),
  largestMemory: atMost('50 000 segments: memory taken', ' MB', 350, 180),
  growthMemory: atMost('growth 4k → 64k: memory', 'n^', 1.2, 1.1),
  growthEvaluations: atMost('growth 4k → 64k: kernel evaluations', 'n^', 1.2, 1.1),
  growthIterations: atMost('growth 4k → 64k: iterations', 'n^', 0.25, 0.15),
  mapSmall: atMost('map 150 × 150, up to 500 segments', ' ms', 33, 8),
  mapLarge: atMost('map 1000 × 1000, 10 000 segments, error to 1e-5', ' ms', 600, 150),
  start: atMost('`ohmstead solve` on the demonstration, process start to result', ' ms', 400, 250),
  resistance: atMost('accuracy: R against the uncompressed solution, worst size', '', 1e-4),
  entries: atMost('accuracy: worst sampled entry as computed, worst size', '', 1e-6),
};

export type Findings = Partial<Record<GoalKey, number>>;

export function judge(goal: Goal, limit: number | undefined, found: number | undefined): Judgement {
  if (found === undefined || limit === undefined) return 'not measured';
  return (goal.sense === 'at least' ? found >= limit : found <= limit) ? 'met' : 'not met';
}

/** Name, measured, must, stretch. */
export function claimRows(findings: Findings): string[][] {
  const keys = Object.keys(goals).filter(isGoal);
  return keys.map((key) => {
    const goal = goals[key];
    const found = findings[key];
    const limit = (value: number | undefined): string =>
      value === undefined ? '–' : `${written(goal, value)}: ${judge(goal, value, found)}`;
    return [
      goal.name,
      found === undefined ? '–' : written(goal, found),
      limit(goal.must),
      limit(goal.stretch),
    ];
  });
}

function isGoal(key: string): key is GoalKey {
  return key in goals;
}

function written({ unit }: Goal, value: number): string {
  if (unit === '') return value.toExponential(value < 1e-3 ? 1 : 0);
  return unit === 'n^' ? `n^${value.toFixed(2)}` : `${short(value)}${unit}`;
}

function faster(name: string, must: number, stretch: number): Goal {
  return { name, unit: '×', sense: 'at least', must, stretch };
}

function atMost(name: string, unit: Goal['unit'], must: number, stretch?: number): Goal {
  return { name, unit, sense: 'at most', must, ...(stretch === undefined ? {} : { stretch }) };
}
