// A temporary folder with a small study in it, for tests that go through the file system.
import { mkdirSync, mkdtempSync, rmSync, writeFileSync } from 'node:fs';
import { tmpdir } from 'node:os';
import { dirname, join } from 'node:path';
import { afterEach, beforeEach } from 'vitest';

export const STUDY_JSON: string = JSON.stringify({
  format: 'ohmstead-study',
  version: 1,
  title: 'Two rods',
  soil: { layers: [{ resistivity_ohm_m: 100 }] },
  conductors: ['tables/rods.csv'],
  cases: [
    { name: 'bus', grid_current_A: 100, duration_s: 0.5 },
    { name: 'feeder', grid_current_A: 50, duration_s: 1 },
  ],
  limits: { basis: 'IEEE 80', body_mass_kg: 70 },
});

export const RODS_CSV: string = `id,x1_m,y1_m,depth1_m,x2_m,y2_m,depth2_m,diameter_mm
left,0,0,0.5,0,0,3.5,16
bar,0,0,0.5,5,0,0.5,10
right,5,0,0.5,5,0,3.5,16
`;

export interface StudyFolder {
  /** absolute path of a name in the temporary folder */
  readonly at: (name: string) => string;
  readonly write: (name: string, content: string | Uint8Array) => void;
}

/** Made anew for each test of the file, with the study in `study/`. */
export function studyFolder(): StudyFolder {
  let root = '';
  const at = (name: string): string => join(root, name);
  const write = (name: string, content: string | Uint8Array): void => {
    mkdirSync(dirname(at(name)), { recursive: true });
    writeFileSync(at(name), content);
  };
  beforeEach(() => {
    root = mkdtempSync(join(tmpdir(), 'ohmstead-'));
    write('study/study.json', STUDY_JSON);
    write('study/tables/rods.csv', RODS_CSV);
  });
  afterEach(() => rmSync(root, { recursive: true }));
  return { at, write };
}
