// What the reader takes away: the study, the review pack, a table or a figure.
import { writeZip } from '@ohmstead/pack';
import { figures, tables } from '@ohmstead/sheet';
import type { Outcome } from '@ohmstead/study';
import { type Draft, valueAt } from '../desk/draft.ts';
import type { Engine } from '../engine/client.ts';
import { download, fileStem } from '../files/download.ts';
import { type Bench, draftOf } from './bench.ts';

function titleOf(draft: Draft): string {
  const title = valueAt(draft, ['title']);
  return typeof title === 'string' ? title : '';
}

/** The study's files as a zip, exactly as they stand. */
export async function saveStudy(draft: Draft): Promise<void> {
  const zip = writeZip(draft.files);
  download(`${fileStem(titleOf(draft))}.zip`, new Uint8Array(zip), 'application/zip');
}

/** The review pack of the present outcome. */
export async function takePack(engine: Engine, bench: Bench): Promise<void> {
  if (bench.solved === undefined) return;
  const reply = await engine.ask(bench.solved.run, { kind: 'pack' });
  if (reply.kind !== 'pack') return;
  download(`${fileStem(titleOf(draftOf(bench)))}-review.zip`, reply.pack, 'application/zip');
}

/** A figure or a table by the name that it has in a review pack. */
export function takeFile(outcome: Outcome, file: string): void {
  const figure = figures(outcome).find(({ name }) => `${name}.svg` === file);
  if (figure !== undefined) download(file, figure.svg, 'image/svg+xml');
  const table = tables(outcome).find(({ name }) => `${name}.csv` === file);
  if (table !== undefined) download(file, table.csv, 'text/csv');
}
