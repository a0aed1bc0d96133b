// Study and outcome → the entries of a review pack, without its manifest.
import type { PageProgram } from '@ohmstead/sheet';
import type { LoadedStudy, Outcome } from '@ohmstead/study';
import { entryNameComplaint } from './entry-name.ts';
import { jsonText } from './json-text.ts';
import type { Renderer } from './renderer.ts';

export const SHEET_NAME: string = 'index.html';
export const RESULTS_NAME: string = 'results.json';
export const STUDY_FOLDER: string = 'study/';
const FIGURE_FOLDER = 'figures/';
const TABLE_FOLDER = 'tables/';

/**
 * Everything a review pack holds but the manifest.
 * @param loaded its files go into `study/` exactly as read
 * @param outcome of solving it
 * @param drawing what draws sheet, figures and tables, and the program that the sheet carries, if any
 * @returns contents by path
 * @throws Error where two entries would bear one name, or a name would leave the pack
 */
export function packEntries(
  loaded: LoadedStudy,
  outcome: Outcome,
  { renderer, program }: { readonly renderer: Renderer; readonly program: PageProgram | undefined },
): ReadonlyMap<string, Uint8Array> {
  const entries = new Map<string, Uint8Array>();
  const add = (path: string, content: Uint8Array): void => {
    const complaint = entries.has(path) ? 'stands twice' : entryNameComplaint(path);
    if (complaint !== undefined) throw new Error(`pack entry ${JSON.stringify(path)}: ${complaint}`);
    entries.set(path, content);
  };
  const encoder = new TextEncoder();
  add(SHEET_NAME, encoder.encode(renderer.sheetHtml(outcome, program)));
  for (const { name, svg } of renderer.figures(outcome)) add(`${FIGURE_FOLDER}${name}`, encoder.encode(svg));
  for (const { name, csv } of renderer.tables(outcome)) add(`${TABLE_FOLDER}${name}`, encoder.encode(csv));
  add(RESULTS_NAME, encoder.encode(jsonText(outcome.results)));
  for (const [path, content] of loaded.files) add(`${STUDY_FOLDER}${path}`, content);
  return entries;
}
