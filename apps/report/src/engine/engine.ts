// The engine as a worker: one classic script that loads, solves, compares and packs studies.
import { messageTurn } from './message-turn.ts';
import type { EngineRequest } from './messages.ts';
import { engineServer } from './server.ts';

declare const self: DedicatedWorkerGlobalScope;

const take = engineServer({
  say: (answer, transfer = []) => self.postMessage(answer, transfer),
  pause: messageTurn(),
});

self.onmessage = (event: MessageEvent<EngineRequest>): void => take(event.data);
