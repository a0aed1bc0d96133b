// `ohmstead field`: potential and touch voltage at points of the user's choice, as CSV.
import {
  type Fault,
  type FieldPoint,
  type FieldValue,
  InputFaults,
  type LoadedStudy,
  type PointTable,
} from '@ohmstead/study';
import type { Arguments, Command } from './command.ts';
import type { Engine } from './engine.ts';
import { DONE, type ExitStatus } from './exit-status.ts';
import { fileSource } from './file-source.ts';
import type { Io } from './io.ts';
import { openStudy } from './open-study.ts';
import { printable } from './printable.ts';
import { withProgress } from './progress.ts';
import { suggestion } from './suggestion.ts';

export const field: Command = {
  name: 'field',
  operand: 'STUDY',
  summary: 'potential of the soil and touch voltage at points of your choice, as CSV',
  options: [
    {
      name: 'points',
      value: 'POINTS.csv',
      required: true,
      help: 'table with columns x_m, y_m and, if not at the surface, depth_m',
    },
    { name: 'case', value: 'NAME', help: 'fault case, by its name in the study; without it the first one' },
  ],
  details: [
    'Prints one row a point: x_m,y_m,depth_m,potential_V,touch_V. The touch voltage is the potential of the reachable metal minus that of the soil at the point.',
  ],
  example: 'ohmstead field test-data/aldermoor --points points.csv --case "33 kV bus" > field.csv',
  run: runField,
};

async function runField(given: Arguments, io: Io, engine: Engine): Promise<ExitStatus> {
  const loaded = engine.loadStudy(await openStudy(given.operand));
  const path = given.values.get('points') ?? '';
  const points = engine.loadPoints(fileSource(path), path);
  const name = caseName(loaded, given.values.get('case'));
  for (const { code, message } of points.notes) io.err(`note: ${printable(message)} (${code})\n`);
  if (!given.values.has('case') && loaded.study.cases.length > 1) io.err(`case: ${printable(name)}\n`);
  const values = await withProgress(io, (report) => engine.fieldAt(loaded, rows(points), name, report));
  io.out(csv(values));
  return DONE;
}

function caseName(loaded: LoadedStudy, given: string | undefined): string {
  const names = loaded.study.cases.map(({ name }) => name);
  if (given === undefined) return names[0];
  if (names.includes(given)) return given;
  const near = suggestion(given, names);
  const hint = near === undefined ? `expected one of ${names.join(', ')}` : `did you mean ${near}?`;
  const fault: Fault = {
    file: 'ohmstead field',
    place: '--case',
    code: 'unknown-case',
    message: `${given} is not a case of the study; ${hint}`,
  };
  throw new InputFaults([fault]);
}

function rows({ count, x, y, depth }: PointTable): readonly FieldPoint[] {
  return Array.from({ length: count }, (_, i) => ({ x_m: x[i], y_m: y[i], depth_m: depth[i] }));
}

/** Numbers in full, as they read back exactly. */
function csv(values: readonly FieldValue[]): string {
  const lines = values.map(({ x_m, y_m, depth_m, potential_V, touch_V }) =>
    [x_m, y_m, depth_m, potential_V, touch_V].join(','),
  );
  return ['x_m,y_m,depth_m,potential_V,touch_V', ...lines, ''].join('\n');
}
