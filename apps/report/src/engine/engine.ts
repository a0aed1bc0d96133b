// The engine as a worker: one classic script that loads, solves, compares and packs studies, or helps another to.
import { messageTurn } from './message-turn.ts';
import type { EngineRequest } from './messages.ts';
import { HELPER, help, nestedCrew } from './nested-crew.ts';
import { engineServer } from './server.ts';

declare const self: DedicatedWorkerGlobalScope;

if (self.name === HELPER) help();
else {
  let text: string | undefined;
  const take = engineServer({
    say: (answer, transfer = []) => self.postMessage(answer, transfer),
    pause: messageTurn(),
    crew: nestedCrew(() => text),
  });
  self.onmessage = ({ data }: MessageEvent<EngineRequest>): void => {
    if (data.kind === 'carry') text = data.scripts.engine;
    take(data);
  };
}
