// People: the tolerable voltages, and every worst voltage against them.
import type { Outcome } from '@ohmstead/study';
import type { VNode } from 'preact';
import { useDesk } from '../desk/use-desk.ts';
import { Download } from '../field/download.tsx';
import { undecidedReason } from '../verdict/finding.ts';
import { type VerdictRow, verdictRows } from '../verdict/rows.ts';
import { soilBandRows } from '../verdict/soil-band.ts';
import { Limits } from './limits.tsx';
import { Part } from './part.tsx';
import { CaseName, Say } from './parts.tsx';
import { SoilBandTable } from './soil-band-table.tsx';
import { VerdictTable } from './verdict-table.tsx';

function Undecided({ rows }: { rows: readonly VerdictRow[] }): VNode {
  return (
    <>
      {rows
        .filter((row) => row.finding === 'undecided')
        .map((row) => (
          <Say key={`${row.caseIndex} ${row.subject}`}>
            <CaseName name={row.caseName} />, {row.subject}: {undecidedReason(row)}
          </Say>
        ))}
    </>
  );
}

/** What the readings leave open in touch and step voltage; nothing where the soil was given. */
function Soils({ outcome }: { outcome: Outcome }): VNode | null {
  const before = useDesk()?.before;
  const rows = soilBandRows(outcome.results);
  if (rows.length === 0) return null;
  return (
    <>
      <Say>
        What the readings leave open: the same currents in the soils that they allow, beside the best fit and
        against its limits. This spread belongs to the soil; the ± of the best fit belongs to the mesh, and
        neither holds the other.
      </Say>
      <SoilBandTable
        rows={rows}
        pinned={before === undefined ? undefined : soilBandRows(before.results)}
        id="soils"
      />
      <Download file="ground-consequence.csv" />
    </>
  );
}

/** Limits, bars, what cannot be decided, what the soil leaves open. */
export function People({ outcome }: { outcome: Outcome }): VNode {
  const before = useDesk()?.before;
  const { limits } = outcome.results;
  const rows = verdictRows(outcome.results);
  const floating = rows.some((row) => row.kind === 'floating');
  const facts = ['IEEE Std 80-2013, 8.3–8.4', `${limits.body_mass_kg}\u202fkg`];
  return (
    <Part id="people" title="People" facts={facts} outcome={outcome}>
      <Limits outcome={outcome} />
      <VerdictTable
        rows={rows}
        caption="Worst voltages against their limits; the tick across the bars is the limit"
        id="people"
        pinned={before === undefined ? undefined : verdictRows(before.results)}
        file="limits.csv"
      />
      <Undecided rows={rows} />
      <Soils outcome={outcome} />
      {floating && limits.surfacing_resistivity_ohm_m !== null && (
        <Say>
          Floating metal is set against the limit of the ground beside it: the covering where it reaches
          there, bare soil elsewhere.
        </Say>
      )}
      <p class="caution">
        These limits suppose that clearing times, covering and access are as stated. Local codes and a
        licensed engineer decide; measure before energising.
      </p>
    </Part>
  );
}
