// The engine itself on a small study: stages, cancelling between them, questions about what is solved.
import { readPack } from '@ohmstead/pack';
import { expect, test } from 'vitest';
import { messageTurn } from '../../../src/engine/message-turn.ts';
import type { EngineAnswer, EngineRequest } from '../../../src/engine/messages.ts';
import { engineServer } from '../../../src/engine/server.ts';

const scripts = { starter: 'start()', engine: 'serve()' };
const study = {
  format: 'ohmstead-study',
  version: 1,
  title: 'One rod',
  soil: { layers: [{ resistivity_ohm_m: 100 }] },
  conductors: ['rod.csv'],
  cases: [{ name: 'only', grid_current_A: 100, duration_s: 0.5 }],
  limits: { basis: 'IEEE 80', body_mass_kg: 70 },
};
const table = 'id,x1_m,y1_m,depth1_m,x2_m,y2_m,depth2_m,diameter_mm\nrod,0,0,0.5,0,0,3.5,16\n';

function filesOf(changes: object = {}): ReadonlyMap<string, Uint8Array> {
  const encoder = new TextEncoder();
  return new Map([
    ['rod.csv', encoder.encode(table)],
    ['study.json', encoder.encode(JSON.stringify({ ...study, ...changes }))],
  ]);
}

function served() {
  const said: EngineAnswer[] = [];
  let wake: (() => void) | undefined;
  let wanted: EngineAnswer['kind'] | undefined;
  const take = engineServer({
    say: (answer) => {
      said.push(answer);
      if (answer.kind === wanted) wake?.();
    },
    pause: messageTurn(),
  });
  /** Takes requests, then waits for an answer of a kind. */
  const until = (kind: EngineAnswer['kind'], ...requests: readonly EngineRequest[]): Promise<void> =>
    new Promise((resolve) => {
      wanted = kind;
      wake = resolve;
      for (const request of requests) take(request);
    });
  return { said, until };
}

const ofRun = (said: readonly EngineAnswer[], run: number): string[] => [
  ...new Set(said.flatMap((answer) => ('run' in answer && answer.run === run ? [answer.kind] : []))),
];

const solve = (run: number, files: ReadonlyMap<string, Uint8Array> = filesOf()): EngineRequest => ({
  kind: 'solve',
  run,
  files,
});
const askPack = (run: number, ask: number): EngineRequest => ({
  kind: 'ask',
  run,
  ask,
  question: { kind: 'pack' },
});

test('progress, an early outcome, the outcome; then its pack when asked', async () => {
  const { said, until } = served();
  await until('solved', solve(1));
  expect(ofRun(said, 1)).toEqual(['progress', 'first', 'solved']);
  await until('told', { kind: 'carry', scripts }, askPack(1, 5));
  const told = said.at(-1);
  if (told?.kind !== 'told' || told.reply.kind !== 'pack') throw new Error('no pack');
  expect(told.ask).toBe(5);
  const { entries } = await readPack(told.reply.pack);
  expect(entries.get('study/rod.csv')).toEqual(filesOf().get('rod.csv'));
  expect(new TextDecoder().decode(entries.get('index.html'))).toContain(
    `<script>${scripts.starter}</script>`,
  );
});

test('a line and places of the solved field, equal to what the outcome holds', async () => {
  const { said, until } = served();
  await until('solved', solve(1));
  const solved = said.at(-1);
  if (solved?.kind !== 'solved') throw new Error('not solved');
  const { from, to, potential, touch } = solved.outcome.cases[0]!.profile;
  const question = { kind: 'profile', caseIndex: 0, from, to } as const;
  await until('told', { kind: 'ask', run: 1, ask: 1, question });
  expect(said.at(-1)).toMatchObject({ reply: { kind: 'profile', profile: { from, to, potential, touch } } });
  const points = [{ x_m: from[0], y_m: from[1], depth_m: 0 }];
  await until('told', { kind: 'ask', run: 1, ask: 2, question: { kind: 'field', caseIndex: 0, points } });
  const told = said.at(-1);
  if (told?.kind !== 'told' || told.reply.kind !== 'field') throw new Error('no field');
  const [value] = told.reply.values;
  // one is summed by the kernel of the surface, the other by the plain formula; both are the same sum
  expect(Math.abs(value!.potential_V / potential[0]! - 1)).toBeLessThan(1e-6);
  expect(Math.abs(value!.touch_V / touch[0]! - 1)).toBeLessThan(1e-6);
  await until('untold', { kind: 'ask', run: 1, ask: 3, question: { ...question, caseIndex: 1 } });
  expect(said.at(-1)).toMatchObject({ ask: 3, message: 'no case 1' });
});

test('a new run ends the one before between two stages', async () => {
  const { said, until } = served();
  await until('progress', solve(1));
  await until('solved', solve(2), solve(3));
  expect(ofRun(said, 1)).toEqual(['progress', 'ended']);
  expect(ofRun(said, 2)).toEqual(['ended']);
  expect(ofRun(said, 3).at(-1)).toBe('solved');
});

test('cancelling a run that is over leaves the present one alone', async () => {
  const { until } = served();
  await until('solved', solve(1));
  await until('solved', solve(2), { kind: 'cancel', run: 1 });
});

test('a cancelled run ends; the outcome before it can still be asked about, another cannot', async () => {
  const { said, until } = served();
  await until('solved', solve(1));
  await until('progress', solve(2));
  await until('ended', { kind: 'cancel', run: 2 });
  await until('untold', askPack(2, 1));
  expect(said.at(-1)).toMatchObject({ kind: 'untold', ask: 1, message: expect.stringMatching(/anew/) });
  await until('told', askPack(1, 2));
  expect(ofRun(said, 2)).toEqual(['progress', 'ended']);
});

test('faults of the study are told with their places, a zip that is none likewise', async () => {
  const { said, until } = served();
  await until('faults', solve(1, filesOf({ cases: [] })));
  expect(said.at(-1)).toMatchObject({ run: 1, faults: [{ file: 'study.json', place: 'cases' }] });
  await until('faults', solve(2, new Map([['a.zip', new Uint8Array([1, 2, 3])]])));
  expect(said.at(-1)).toMatchObject({ run: 2, faults: [{ file: 'a.zip' }] });
});
