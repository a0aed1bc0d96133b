// Studies kept in the browser's database: several side by side, each with its undo steps and pinned states.
import { type DBSchema, openDB } from 'idb';
import type { History } from '../desk/history.ts';
import type { Pin } from '../desk/pins.ts';

/** A study as it is kept. */
export interface KeptStudy {
  readonly id: string;
  readonly title: string;
  /** when it was kept last, ms since 1970 */
  readonly at: number;
  readonly history: History;
  readonly pins: readonly Pin[];
}

export type KeptSummary = Pick<KeptStudy, 'id' | 'title' | 'at'>;

export interface StudyStore {
  /** newest first */
  readonly list: () => Promise<readonly KeptSummary[]>;
  readonly read: (id: string) => Promise<KeptStudy | undefined>;
  /** @throws Error where the browser has no room or no longer lets the page write */
  readonly write: (study: KeptStudy) => Promise<void>;
  readonly remove: (id: string) => Promise<void>;
}

interface Schema extends DBSchema {
  studies: { key: string; value: KeptStudy };
  summaries: { key: string; value: KeptSummary };
}

const NAME = 'ohmstead';
const VERSION = 1;
/** Undo steps kept. Reason: a morning's work; writing stays quick. */
const KEPT_STEPS = 100;

/** @throws Error where the browser keeps nothing for this page */
export async function openStudyStore(): Promise<StudyStore> {
  const db = await openDB<Schema>(NAME, VERSION, {
    upgrade(made) {
      made.createObjectStore('studies', { keyPath: 'id' });
      made.createObjectStore('summaries', { keyPath: 'id' });
    },
    // another tab with a newer program: this one must not stand in its way
    blocking: () => db.close(),
  });
  return {
    list: async () => (await db.getAll('summaries')).toSorted((a, b) => b.at - a.at),
    read: (id) => db.get('studies', id),
    async write(study) {
      const { id, title, at } = study;
      const both = db.transaction(['studies', 'summaries'], 'readwrite');
      await Promise.all([
        both.objectStore('studies').put(slim(study)),
        both.objectStore('summaries').put({ id, title, at }),
        both.done,
      ]);
    },
    async remove(id) {
      const both = db.transaction(['studies', 'summaries'], 'readwrite');
      await Promise.all([
        both.objectStore('studies').delete(id),
        both.objectStore('summaries').delete(id),
        both.done,
      ]);
    },
  };
}

/** Without maps, which are computed again, and without the oldest undo steps. */
function slim(study: KeptStudy): KeptStudy {
  const { past, present, future } = study.history;
  return {
    ...study,
    history: { past: past.slice(-KEPT_STEPS), present, future: future.slice(0, KEPT_STEPS) },
    pins: study.pins.map(({ outcome: _, ...kept }) => kept),
  };
}
