// Assumed: what was taken for granted, which contacts were bridged, and where an engineer should doubt.
import type { Outcome } from '@ohmstead/study';
import type { VNode } from 'preact';
import { given, place } from '../format/number.ts';
import { tally } from '../format/words.ts';
import { otherDoubts } from '../verdict/doubts.ts';
import { DataTable, Part, Say } from './parts.tsx';
import { Remarks } from './remarks.tsx';

function Snaps({ outcome }: { outcome: Outcome }): VNode {
  const { snaps } = outcome.results;
  return (
    <>
      <h3>Contacts bridged</h3>
      <Say>Metal that touches without its axes meeting is joined as one node.</Say>
      <DataTable
        caption="Joined as one node"
        columns={[
          { label: 'conductor' },
          { label: 'joined to' },
          { label: 'at', align: 'right' },
          { label: 'depth, m', align: 'right' },
          { label: 'between axes, mm', align: 'right' },
        ]}
        rows={snaps.map((snap) => [
          snap.id,
          snap.other_id,
          place(snap.x_m, snap.y_m),
          given(snap.depth_m),
          given(Number((snap.distance_m * 1000).toPrecision(3))),
        ])}
      />
    </>
  );
}

/** Assumptions, doubts, bridged contacts. */
export function Assumed({ outcome }: { outcome: Outcome }): VNode {
  const { assumptions, snaps } = outcome.results;
  const warnings = otherDoubts(outcome.results);
  const facts = [
    tally(assumptions.length, 'assumption'),
    tally(warnings.length, 'doubt'),
    `${tally(snaps.length, 'contact')} bridged`,
  ];
  return (
    <Part id="assumed" title="Assumed" facts={facts}>
      {warnings.length > 0 && <Remarks title="Doubts" remarks={warnings} />}
      {assumptions.length > 0 ? (
        <Remarks title="Taken for granted" remarks={assumptions} />
      ) : (
        <Say>Nothing beyond what the study states was taken for granted.</Say>
      )}
      {snaps.length > 0 && <Snaps outcome={outcome} />}
    </Part>
  );
}
