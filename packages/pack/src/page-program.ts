// What a pack's sheet carries to compute itself anew: the program, the study's files and the results on record.
import type { PageProgram } from '@ohmstead/sheet';
import type { LoadedStudy } from '@ohmstead/study';
import { base64 } from './base64.ts';
import { dataBlock } from './data-block.ts';
import { sha256Bytes } from './sha256.ts';

/** Texts of the built scripts. */
export interface PageScripts {
  /** run by the page itself */
  readonly starter: string;
  /** run as a worker when the reader asks for it */
  readonly engine: string;
}

/** A file of the study: as text where that gives the same bytes back, so that it can be read in the page's source. */
export type RecordFile = { readonly text: string } | { readonly base64: string };

export interface PageRecord {
  readonly files: Readonly<Record<string, RecordFile>>;
  /** as the pack's results file has them */
  readonly results: unknown;
}

/** Ids of the page's data blocks. */
export const RECORD_BLOCK: string = 'ohmstead-record';
export const ENGINE_BLOCK: string = 'ohmstead-engine';

/**
 * @param scripts the starter is written into the page as it stands
 * @param loaded its files go into the record as read
 * @param results that go into the record
 * @throws Error where the starter would end its own script element
 */
export async function pageProgram(
  scripts: PageScripts,
  loaded: LoadedStudy,
  results: unknown,
): Promise<PageProgram> {
  if (/<\/script|<!--/i.test(scripts.starter)) throw new Error('the starter would end its script element');
  const files = Object.fromEntries([...loaded.files].map(([path, bytes]) => [path, recordFile(bytes)]));
  const record: PageRecord = { files, results };
  return {
    starter: scripts.starter,
    starterDigest: base64(await sha256Bytes(new TextEncoder().encode(scripts.starter))),
    data: new Map([
      [RECORD_BLOCK, dataBlock(record)],
      [ENGINE_BLOCK, dataBlock(scripts.engine)],
    ]),
  };
}

/** A byte order mark is part of the text; bytes that are not UTF-8 are kept as bytes. */
function recordFile(bytes: Uint8Array): RecordFile {
  try {
    return { text: new TextDecoder('utf-8', { fatal: true, ignoreBOM: true }).decode(bytes) };
  } catch {
    return { base64: base64(bytes) };
  }
}
