// A crew of workers of the engine's own text, which the engine starts from within itself when first asked.
import {
  type Crew,
  crewOf,
  type Helper,
  type HelperHearing,
  helperCount,
  type Order,
  partWorks,
  type Said,
  workshop,
} from '@ohmstead/core';

declare const self: DedicatedWorkerGlobalScope;

/** Name of a worker that is to help an engine, not to be one. */
export const HELPER = 'helper';

/**
 * Shared memory is only for pages that isolate themselves from all others; elsewhere vectors are moved.
 * @param text of the engine, once it is known
 */
export function nestedCrew(text: () => string | undefined): Crew {
  return crewOf(helperCount(self.navigator.hardwareConcurrency), {
    shared: self.crossOriginIsolated,
    start: (hear) => nested(text(), hear),
  });
}

/** The text's own address, made by the page, would be refused where that is a file. */
function nested(text: string | undefined, { said, broken }: HelperHearing): Helper {
  if (text === undefined) throw new Error('the text of a helper is not known');
  const url = URL.createObjectURL(new Blob([text], { type: 'text/javascript' }));
  const worker = new Worker(url, { name: HELPER });
  let settled = (): void => {};
  // a browser goes on starting it only while the engine's own thread is idle
  const underWay = new Promise<void>((done) => {
    settled = () => {
      URL.revokeObjectURL(url);
      done();
    };
  });
  worker.onmessage = () => {
    worker.onmessage = (event: MessageEvent<Said>) => said(event.data);
    settled();
  };
  worker.onmessageerror = () => broken('an answer cannot be read');
  worker.onerror = (event) => {
    event.preventDefault();
    broken(event.message);
  };
  return {
    underWay,
    post: (order, moved) => worker.postMessage(order, [...moved]),
    end() {
      worker.terminate();
      settled();
    },
  };
}

/** Makes this worker a helper, which says so. */
export function help(): void {
  const take = workshop(partWorks(), (said, moved) => self.postMessage(said, [...moved]));
  self.onmessage = (event: MessageEvent<Order>) => take(event.data);
  self.postMessage('under way');
}
