// Assumed: what was taken for granted, which contacts were bridged, and where an engineer should doubt.
import type { Outcome } from '@ohmstead/study';
import type { VNode } from 'preact';
import { useUnits } from '../desk/use-units.ts';
import { givenIn, lengthUnit, smallUnit } from '../format/length.ts';
import { given } from '../format/number.ts';
import { tally } from '../format/words.ts';
import { otherDoubts } from '../verdict/doubts.ts';
import { Part } from './part.tsx';
import { DataTable, Say } from './parts.tsx';
import { PlaceLink } from './place-link.tsx';
import { Remarks } from './remarks.tsx';

function Snaps({ outcome }: { outcome: Outcome }): VNode {
  const units = useUnits();
  const [unit, small] = [lengthUnit(units), smallUnit(units)];
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
          { label: `depth, ${unit.sign}`, align: 'right' },
          { label: `between axes, ${small.sign}`, align: 'right' },
        ]}
        rows={snaps.map((snap) => [
          snap.id,
          snap.other_id,
          <PlaceLink key={snap.id} x={snap.x_m} y={snap.y_m} />,
          givenIn(snap.depth_m, unit),
          given(Number((snap.distance_m / small.metres).toPrecision(3))),
        ])}
        file="snaps.csv"
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
    <Part id="assumed" title="Assumed" facts={facts} outcome={outcome}>
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
