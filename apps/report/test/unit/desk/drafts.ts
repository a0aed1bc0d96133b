// Drafts for tests: of the demonstration studies, and small ones in memory.
import { readdirSync, readFileSync } from 'node:fs';
import { fileURLToPath } from 'node:url';
import { type LoadedStudy, loadStudy, sourceFromMap } from '@ohmstead/study';
import type { Draft } from '../../../src/desk/draft.ts';
import { openDraft } from '../../../src/desk/open-draft.ts';

const testData = fileURLToPath(new URL('../../../../../test-data/', import.meta.url));

export function filesOf(name: string): ReadonlyMap<string, Uint8Array> {
  return new Map(
    readdirSync(`${testData}${name}`)
      .sort()
      .map((path) => [path, new Uint8Array(readFileSync(`${testData}${name}/${path}`))]),
  );
}

export function bytesOf(text: string): Uint8Array {
  return new TextEncoder().encode(text);
}

export function textOf(draft: Draft, path: string): string {
  return new TextDecoder('utf-8', { ignoreBOM: true }).decode(draft.files.get(path));
}

/** Opens files that are expected to give a draft. */
export function opened(files: ReadonlyMap<string, Uint8Array>): Draft {
  const opening = openDraft(files);
  if (opening.kind === 'faults') throw new Error(opening.faults.map(({ message }) => message).join('\n'));
  return opening.draft;
}

export function demo(name: string): Draft {
  return opened(filesOf(name));
}

export function loaded({ files }: Draft): LoadedStudy {
  return loadStudy(sourceFromMap(files));
}

/** Invented: nothing more than a study needs. */
export const smallStudy = {
  format: 'ohmstead-study',
  version: 1,
  title: 'Small square',
  soil: { layers: [{ resistivity_ohm_m: 100 }] },
  conductors: ['conductors.csv'],
  cases: [{ name: 'bus', grid_current_A: 1000, duration_s: 0.5 }],
  limits: { basis: 'IEEE 80', body_mass_kg: 70 },
};

/** Invented: a square of 10 m. */
export const smallTable = [
  'id,x1_m,y1_m,depth1_m,x2_m,y2_m,depth2_m,diameter_mm',
  'A,0,0,0.5,10,0,0.5,10',
  'B,10,0,0.5,10,10,0.5,10',
  'C,10,10,0.5,0,10,0.5,10',
  'D,0,10,0.5,0,0,0.5,10',
  '',
].join('\n');

export function small(study: unknown = smallStudy, table: string = smallTable): Draft {
  return opened(
    new Map([
      ['study.json', bytesOf(`${JSON.stringify(study, null, 2)}\n`)],
      ['conductors.csv', bytesOf(table)],
    ]),
  );
}
