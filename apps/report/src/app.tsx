// The live sheet: open a study, see it computed, take the review pack away.
import { Sheet } from '@ohmstead/sheet';
import { faultLine } from '@ohmstead/study';
import type { VNode } from 'preact';
import { useEffect, useMemo, useState } from 'preact/hooks';
import { demoFiles } from './demo.ts';
import { blobWorker } from './engine/blob-worker.ts';
import { createEngine, type Engine } from './engine/client.ts';
import type { RunAnswer } from './engine/messages.ts';
import { studyFiles } from './study-files.ts';

/** Lets a file field take a whole folder; every browser knows it, no standard types do. */
const WHOLE_FOLDER: Readonly<Record<string, string>> = { webkitdirectory: '' };

type State =
  | { readonly kind: 'empty' }
  | { readonly kind: 'cancelled' }
  | Exclude<RunAnswer, { kind: 'first' | 'ended' }>;

/** Text of the engine, read beside the page so that the page is drawn first. */
const engineText: Promise<string> = import('./engine/text.ts').then((module) => module.engineText);

export function App(): VNode {
  const [state, setState] = useState<State>({ kind: 'empty' });
  const engine = useMemo(
    () =>
      createEngine({
        begin: (hear) => blobWorker(engineText, hear),
        hear: (answer) => {
          if (answer.kind !== 'first') setState(answer);
        },
      }),
    [],
  );
  const open = (files: ReadonlyMap<string, Uint8Array>): void => {
    setState({ kind: 'progress', run: 0, stage: 'reading the study', share: 0 });
    engine.solve(files);
  };
  const openFiles = (list: FileList | null): void => {
    if (list !== null && list.length > 0) void studyFiles([...list]).then(open);
  };
  useDroppedFiles((list) => openFiles(list));
  return (
    <div class="live">
      <nav class="desk" aria-label="study">
        <label>
          Open a study folder
          <input type="file" {...WHOLE_FOLDER} onChange={(event) => openFiles(event.currentTarget.files)} />
        </label>
        <label>
          Open files, a zip or a review pack
          <input
            type="file"
            multiple
            accept=".json,.csv,.zip"
            onChange={(event) => openFiles(event.currentTarget.files)}
          />
        </label>
        <button type="button" onClick={() => open(demoFiles())}>
          Try the demonstration study
        </button>
      </nav>
      <Reading
        state={state}
        engine={engine}
        cancel={() => {
          engine.cancel();
          setState({ kind: 'cancelled' });
        }}
      />
    </div>
  );
}

interface ReadingProps {
  readonly state: State;
  readonly engine: Engine;
  readonly cancel: () => void;
}

function Reading({ state, engine, cancel }: ReadingProps): VNode {
  switch (state.kind) {
    case 'empty':
      return (
        <main class="word">
          <h1>Ohmstead</h1>
          <p>
            Open or drop a study: <code>study.json</code> with its conductor tables, a zip of them, or a
            review pack. It is computed in this page; nothing is sent anywhere.
          </p>
          <p>
            Results are calculations from the inputs given. Whether an installation is acceptable is for local
            codes and licensed practice to decide.
          </p>
        </main>
      );
    case 'cancelled':
      return (
        <main class="word">
          <p role="status">Computing was cancelled. Open a study to begin again.</p>
        </main>
      );
    case 'progress':
      return (
        <main class="word">
          <p role="status">{`Computing: ${state.stage}`}</p>
          <progress max={1} value={state.share} aria-label="computing" />
          <p>
            <button type="button" onClick={cancel}>
              Cancel
            </button>
          </p>
        </main>
      );
    case 'faults':
      return (
        <main class="word">
          <h1>The study cannot be read</h1>
          <ul role="alert" class="faults">
            {state.faults.map((fault) => (
              <li key={faultLine(fault)}>{faultLine(fault)}</li>
            ))}
          </ul>
        </main>
      );
    case 'failed':
      return (
        <main class="word">
          <h1>A fault of the program</h1>
          <p role="alert">{state.message}</p>
        </main>
      );
    case 'solved':
      return (
        <main>
          <p class="take">
            <TakePack engine={engine} run={state.run} title={state.outcome.results.title} />
          </p>
          <Sheet outcome={state.outcome} />
        </main>
      );
  }
}

function TakePack({ engine, run, title }: { engine: Engine; run: number; title: string }): VNode {
  const [fault, setFault] = useState<string>();
  const take = async (): Promise<void> => {
    const { pack } = await engine.ask(run, { kind: 'pack' });
    const url = URL.createObjectURL(new Blob([pack], { type: 'application/zip' }));
    const link = document.createElement('a');
    link.href = url;
    const name = title
      .toLowerCase()
      .replaceAll(/[^a-z0-9]+/g, '-')
      .replaceAll(/^-|-$/g, '');
    link.download = `${name === '' ? 'study' : name}-review.zip`;
    link.click();
    URL.revokeObjectURL(url);
  };
  return (
    <>
      <button
        type="button"
        onClick={() => {
          setFault(undefined);
          take().catch((error: unknown) => setFault(String(error)));
        }}
      >
        Take the review pack
      </button>
      {fault !== undefined && <span role="alert">{fault}</span>}
    </>
  );
}

/** Files dropped anywhere on the page. */
function useDroppedFiles(take: (list: FileList) => void): void {
  useEffect(() => {
    const over = (event: DragEvent): void => event.preventDefault();
    const drop = (event: DragEvent): void => {
      event.preventDefault();
      if (event.dataTransfer !== null) take(event.dataTransfer.files);
    };
    addEventListener('dragover', over);
    addEventListener('drop', drop);
    return () => {
      removeEventListener('dragover', over);
      removeEventListener('drop', drop);
    };
  });
}
