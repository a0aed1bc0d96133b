// What the page has on record: the study's files, its results, and the engine's text.
import { ENGINE_BLOCK, RECORD_BLOCK } from '@ohmstead/pack';

export interface PageContent {
  readonly files: ReadonlyMap<string, Uint8Array>;
  readonly results: unknown;
}

/**
 * @param page with the blocks that the pack wrote into it
 * @throws Error where they are not as it wrote them
 */
export function pageContent(page: Document): PageContent {
  const record: unknown = block(page, RECORD_BLOCK);
  if (!isObject(record) || !isObject(record.files)) throw new Error('the record in this page is damaged');
  const files = new Map(Object.entries(record.files).map(([path, file]) => [path, bytesOf(file)]));
  return { files, results: record.results };
}

export function engineText(page: Document): string {
  const text: unknown = block(page, ENGINE_BLOCK);
  if (typeof text !== 'string') throw new Error('the engine in this page is damaged');
  return text;
}

function block(page: Document, id: string): unknown {
  return JSON.parse(page.getElementById(id)?.textContent ?? 'null');
}

function bytesOf(file: unknown): Uint8Array {
  if (isObject(file) && typeof file.text === 'string') return new TextEncoder().encode(file.text);
  if (isObject(file) && typeof file.base64 === 'string')
    return Uint8Array.from(atob(file.base64), (letter) => letter.charCodeAt(0));
  throw new Error('a file of the study in this page is damaged');
}

function isObject(value: unknown): value is Readonly<Record<string, unknown>> {
  return typeof value === 'object' && value !== null;
}
