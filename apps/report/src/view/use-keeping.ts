// Keeps the study worked at in the browser's database, and finds it again after a reload or a crash.
import { useCallback, useEffect, useRef, useState } from 'preact/hooks';
import { valueAt } from '../desk/draft.ts';
import { ELSEWHERE, refusedWords, unkeptWords } from '../files/store-words.ts';
import { type KeptStudy, type KeptSummary, openStudyStore, type StudyStore } from '../files/study-store.ts';
import { type Bench, draftOf } from './bench.ts';

/** Edits within this many ms are kept together. */
const PAUSE_MS = 400;
/** On which windows tell each other what they keep. */
const CHANNEL = 'ohmstead-kept';
/** Where a tab remembers which study it works at. */
const TAB_KEY = 'ohmstead-study';

export interface Keeping {
  readonly kept: readonly KeptSummary[];
  /** what the page has to say of its storage */
  readonly word: string | undefined;
  readonly read: (id: string) => Promise<KeptStudy | undefined>;
  readonly remove: (id: string) => void;
  /** whether the study that this tab worked at before is still to be read */
  readonly restoring: string | undefined;
}

/**
 * @param id of the study worked at; undefined where none is
 */
export function useKeeping(bench: Bench | undefined, id: string | undefined): Keeping {
  const [store, setStore] = useState<StudyStore>();
  const [kept, setKept] = useState<readonly KeptSummary[]>([]);
  const [word, setWord] = useState<string>();
  const [elsewhere, setElsewhere] = useState<string>();
  const channel = useRef<BroadcastChannel>(undefined);
  const [restoring, setRestoring] = useState(rememberedStudy);
  useEffect(() => {
    openStudyStore()
      .then(async (opened) => {
        setKept(await opened.list());
        setStore(opened);
      })
      .catch((error: unknown) => {
        setWord(refusedWords(error));
        setRestoring(undefined);
      });
  }, []);
  const latest = useRef<KeptStudy>(undefined);
  const written = useRef<KeptStudy>(undefined);
  if (bench !== undefined && id !== undefined) {
    const { history, pins } = bench;
    if (latest.current?.id !== id || latest.current.history !== history || latest.current.pins !== pins) {
      const title = valueAt(draftOf(bench), ['title']);
      latest.current = {
        id,
        title: typeof title === 'string' && title !== '' ? title : 'without a title',
        at: 0,
        history,
        pins,
      };
    }
  }
  useEffect(() => {
    const opened = new BroadcastChannel(CHANNEL);
    channel.current = opened;
    opened.onmessage = ({ data }: MessageEvent<unknown>) => {
      if (typeof data === 'string') setElsewhere(data);
    };
    return () => opened.close();
  }, []);
  const write = useCallback((): void => {
    const study = latest.current;
    if (store === undefined || study === undefined || study === written.current) return;
    written.current = study;
    store
      .write({ ...study, at: Date.now() })
      .then(async () => {
        setWord(undefined);
        channel.current?.postMessage(study.id);
        setKept(await store.list());
      })
      .catch((error: unknown) => setWord(unkeptWords(error)));
  }, [store]);
  const present = latest.current;
  useEffect(() => {
    if (present === undefined) return;
    const timer = setTimeout(write, PAUSE_MS);
    return () => clearTimeout(timer);
  }, [present, write]);
  useEffect(() => {
    const leaving = (): void => {
      if (document.visibilityState === 'hidden') write();
    };
    document.addEventListener('visibilitychange', leaving);
    return () => document.removeEventListener('visibilitychange', leaving);
  }, [write]);
  useEffect(() => {
    if (id === undefined && restoring !== undefined) return;
    rememberStudy(id);
  }, [id, restoring]);
  return {
    kept,
    word: word ?? (id !== undefined && elsewhere === id ? ELSEWHERE : undefined),
    restoring: store === undefined ? undefined : restoring,
    read: async (wanted) => {
      setRestoring(undefined);
      return store?.read(wanted);
    },
    remove: (gone) => {
      void store?.remove(gone).then(async () => setKept(await store.list()));
    },
  };
}

/** The study that this tab worked at before it was loaded again. */
function rememberedStudy(): string | undefined {
  try {
    return sessionStorage.getItem(TAB_KEY) ?? undefined;
  } catch {
    // storage is refused: nothing is remembered, which the database tells of
    return undefined;
  }
}

function rememberStudy(id: string | undefined): void {
  try {
    if (id === undefined) sessionStorage.removeItem(TAB_KEY);
    else sessionStorage.setItem(TAB_KEY, id);
  } catch {
    // as above
  }
}
