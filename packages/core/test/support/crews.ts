// Crews without threads, for tests: messages are copied as between threads, and helpers fail when told to.
import { onTestFinished } from 'vitest';
import type { Crew } from '../../src/crew/crew.ts';
import { crewOf } from '../../src/crew/helpers.ts';
import { type Order, type Said, workshop } from '../../src/crew/workshop.ts';
import { partWorks } from '../../src/leakage/held-parts.ts';

export interface TriedCrew {
  readonly crew: Crew;
  readonly counts: { started: number; ended: number; orders: number };
}

export interface Manner {
  readonly shared?: boolean;
  /** the how manyeth order, counted over all helpers, breaks its helper; 0: none can be started */
  readonly breaksAt?: number;
  /** the how manyeth order that is answered by a failure */
  readonly failsAt?: number;
}

/** A crew whose helpers are ended with the test. */
export function testCrew(size: number, { shared = false, breaksAt, failsAt }: Manner = {}): TriedCrew {
  const counts = { started: 0, ended: 0, orders: 0 };
  let heard = 0;
  const crew = crewOf(size, {
    shared,
    start({ said, broken }) {
      if (breaksAt === 0) throw new Error('no helper to be had');
      counts.started++;
      const { port1: here, port2: there } = new MessageChannel();
      const take = workshop(partWorks(), (told, moved) => there.postMessage(told, [...moved]));
      there.onmessage = (event: MessageEvent<Order>) => {
        heard++;
        if (heard === breaksAt) broken('it broke');
        else if (heard === failsAt) there.postMessage({ kind: 'failed', message: 'it failed' });
        else take(event.data);
      };
      here.onmessage = (event: MessageEvent<Said>) => said(event.data);
      return {
        post(order, moved) {
          counts.orders++;
          here.postMessage(order, [...moved]);
        },
        end() {
          counts.ended++;
          here.close();
        },
      };
    },
  });
  onTestFinished(() => crew.end());
  return { crew, counts };
}
