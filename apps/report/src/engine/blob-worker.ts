// A worker made from the text of the engine, so that one text serves a hosted page and a file alike.
import type { EngineWorker, Hearing } from './engine-worker.ts';
import type { EngineAnswer, EngineRequest, EngineScripts } from './messages.ts';

/**
 * Starts an engine; requests wait until its text is there.
 * @param scripts the engine's, and the starter where packs are to carry both
 * @param hear is told its answers
 */
export function blobWorker(scripts: Promise<EngineScripts>, hear: Hearing): EngineWorker {
  let worker: Worker | undefined;
  let ended = false;
  const waiting: EngineRequest[] = [];
  const begin = (texts: EngineScripts): void => {
    if (ended) return;
    const url = URL.createObjectURL(new Blob([texts.engine], { type: 'text/javascript' }));
    const begun = new Worker(url, { name: 'engine' });
    worker = begun;
    begun.onmessage = (event: MessageEvent<EngineAnswer>) => {
      // fetched by now
      URL.revokeObjectURL(url);
      hear.answer(event.data);
    };
    begun.onmessageerror = () => hear.broken('an answer of the engine cannot be read');
    begun.onerror = (event) => {
      event.preventDefault();
      hear.broken(event.message);
    };
    begun.postMessage({ kind: 'carry', scripts: texts });
    for (const request of waiting) begun.postMessage(request);
  };
  scripts.then(begin).catch((error: unknown) => hear.broken(String(error)));
  return {
    post(request) {
      if (worker === undefined) waiting.push(request);
      else worker.postMessage(request);
    },
    end() {
      ended = true;
      worker?.terminate();
    },
  };
}
