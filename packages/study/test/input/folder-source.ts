// Studies for tests: from a folder of the test data, or in memory with parts replaced.
import { existsSync, readdirSync, readFileSync, statSync } from 'node:fs';
import { fileURLToPath } from 'node:url';
import { faultLine, InputFaults } from '../../src/fault.ts';
import { loadStudy } from '../../src/input/load-study.ts';
import { type StudySource, sourceFromMap } from '../../src/input/source.ts';

const testData = fileURLToPath(new URL('../../../../test-data/', import.meta.url));

export function testDataPath(name: string): string {
  return `${testData}${name}`;
}

export function folderSource(name: string): StudySource {
  const folder = testDataPath(name);
  return {
    paths: readdirSync(folder).sort(),
    size: (path) => (existsSync(`${folder}/${path}`) ? statSync(`${folder}/${path}`).size : undefined),
    read: (path) => new Uint8Array(readFileSync(`${folder}/${path}`)),
  };
}

export function bytesOf(text: string): Uint8Array {
  return new TextEncoder().encode(text);
}

/** Invented: a square of 10 m, nothing more than a study needs. */
export const smallTable = [
  'id,x1_m,y1_m,depth1_m,x2_m,y2_m,depth2_m,diameter_mm',
  'A,0,0,0.5,10,0,0.5,10',
  'B,10,0,0.5,10,10,0.5,10',
  'C,10,10,0.5,0,10,0.5,10',
  'D,0,10,0.5,0,0,0.5,10',
  '',
].join('\n');

export const smallStudy = {
  format: 'ohmstead-study',
  version: 1,
  title: 'Small square',
  soil: { layers: [{ resistivity_ohm_m: 100 }] },
  conductors: ['conductors.csv'],
  cases: [{ name: 'bus', grid_current_A: 1000, duration_s: 0.5 }],
  limits: { basis: 'IEEE 80', body_mass_kg: 70 },
};

export function memorySource(study: unknown = smallStudy, table: string = smallTable): StudySource {
  const text = typeof study === 'string' ? study : JSON.stringify(study, null, 2);
  return sourceFromMap(
    new Map([
      ['study.json', bytesOf(text)],
      ['conductors.csv', bytesOf(table)],
    ]),
  );
}

/** The fault lines of a call that is expected to refuse its input; none where it does not. */
export function faultLinesOf(call: () => unknown): readonly string[] {
  try {
    call();
    return [];
  } catch (error) {
    if (error instanceof InputFaults) return error.faults.map(faultLine);
    throw error;
  }
}

export function studyFaultLines(source: StudySource): readonly string[] {
  return faultLinesOf(() => loadStudy(source));
}
