// A worker made from the text of the engine, so that one text serves a hosted page and a file alike.
import type { EngineWorker, Hearing } from './engine-worker.ts';
import type { EngineAnswer, EngineRequest } from './messages.ts';

/**
 * Starts an engine; requests wait until its text is there.
 * @param text of the engine's script
 * @param hear is told its answers
 */
export function blobWorker(text: Promise<string>, hear: Hearing): EngineWorker {
  let worker: Worker | undefined;
  let ended = false;
  const waiting: EngineRequest[] = [];
  const begin = (script: string): void => {
    if (ended) return;
    const url = URL.createObjectURL(new Blob([script], { type: 'text/javascript' }));
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
    for (const request of waiting) begun.postMessage(request);
  };
  text.then(begin).catch((error: unknown) => hear.broken(String(error)));
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
