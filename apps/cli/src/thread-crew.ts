// A crew of threads of this process, started when first asked.
import { availableParallelism } from 'node:os';
import { Worker } from 'node:worker_threads';
import { type Crew, crewOf, type Helper, type HelperHearing, helperCount, type Said } from '@ohmstead/core';

/** @param script of a helper @param size helpers at most */
export function threadCrew(script: URL, size: number = helperCount(availableParallelism())): Crew {
  return crewOf(size, { shared: true, start: (hear) => thread(script, hear) });
}

function thread(script: URL, { said, broken }: HelperHearing): Helper {
  const worker = new Worker(script);
  let awaited = 0;
  // one that nobody waits for must not keep the process from ending
  worker.unref();
  worker.on('message', (told: Said) => {
    awaited--;
    if (awaited === 0) worker.unref();
    said(told);
  });
  worker.on('messageerror', (error: Error) => broken(error.message));
  worker.on('error', (error: Error) => broken(error.message));
  worker.on('exit', () => broken('its thread ended'));
  return {
    post(order, moved) {
      worker.postMessage(order, [...moved]);
      awaited++;
      worker.ref();
    },
    end: () => void worker.terminate(),
  };
}
