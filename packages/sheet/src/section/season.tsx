// Season: the soil in its other states, and which of them governs.
import type { EnvelopeCase, Outcome, Results, SeasonResult } from '@ohmstead/study';
import type { VNode } from 'preact';
import { fixed, measured, quantity } from '../format/number.ts';
import { countWord, tally } from '../format/words.ts';
import { AS_GIVEN, seasonRows } from '../verdict/season-rows.ts';
import { Layers } from './layers.tsx';
import { CaseName, DataTable, Part, Result, Say } from './parts.tsx';
import { VerdictTable } from './verdict-table.tsx';

function SeasonSoil({ season, fitted }: { season: SeasonResult; fitted: boolean }): VNode {
  return (
    <Say>
      <CaseName name={season.name} />:{' '}
      <Layers layers={season.layers} origin={fitted ? 'from fitted' : 'from stated'} />. The resistance is{' '}
      <Result>{measured(season.resistance_ohm, season.resistance_uncertainty_ohm, 'Ω')}</Result>
      {`, the covering factor ${fixed(season.covering_factor, 3)}`}.
    </Say>
  );
}

function governs(given: EnvelopeCase): string {
  const touch = given.touch.season;
  const step = given.step.season;
  const who =
    touch === step ? `${touch} governs touch and step` : `${touch} governs touch, ${step} governs step`;
  return `${who}; the rise is highest in ${given.gpr.season}, ${quantity(given.gpr.gpr_V, 'V')}.`;
}

/** Resistance and rise by season, the highest rise of each case marked. */
function RiseTable({ results }: { results: Results }): VNode {
  const { cases, seasons, envelope, electrode } = results;
  const rise = (season: string, k: number, of: Results['cases'][number] | SeasonResult['cases'][number]) => {
    const highest = envelope[k]?.gpr.season === season ? ', highest' : '';
    return `${measured(of.gpr_V, of.gpr_uncertainty_V, 'V')}${highest}`;
  };
  return (
    <DataTable
      caption="Resistance and rise by season"
      columns={[
        { label: 'season' },
        { label: 'resistance', align: 'right' },
        ...cases.map((of) => ({ label: `rise, ${of.name}`, align: 'right' as const })),
      ]}
      rows={[
        [
          AS_GIVEN,
          measured(electrode.resistance_ohm, electrode.resistance_uncertainty_ohm, 'Ω'),
          ...cases.map((of, k) => rise(AS_GIVEN, k, of)),
        ],
        ...seasons.map((season) => [
          season.name,
          measured(season.resistance_ohm, season.resistance_uncertainty_ohm, 'Ω'),
          ...season.cases.map((of, k) => rise(season.name, k, of)),
        ]),
      ]}
    />
  );
}

/** Other states of the soil; absent where the study names none. */
export function Season({ outcome }: { outcome: Outcome }): VNode | null {
  const { seasons, envelope, electrodes, ground } = outcome.results;
  if (seasons.length === 0) return null;
  const floating = electrodes.some((metal) => metal.role === 'floating');
  return (
    <Part id="season" title="Season" facts={[tally(seasons.length, 'other season')]}>
      <Say>
        The soil was solved in {countWord(seasons.length)} more {seasons.length === 1 ? 'state' : 'states'}.
        What governs a case is its smallest margin over all of them, not its largest voltage: the limits
        change with the soil under the covering too.
      </Say>
      {seasons.map((season) => (
        <SeasonSoil key={season.name} season={season} fitted={ground !== null} />
      ))}
      {envelope.map((given) => (
        <Say key={given.name}>
          <CaseName name={given.name} />: {governs(given)}
        </Say>
      ))}
      <VerdictTable
        rows={seasonRows(outcome.results)}
        caption="Each case in each season against the limit of that season; the smallest margin governs"
        id="season"
        bySeason
      />
      <RiseTable results={outcome.results} />
      <Say>
        The maps show the soil as given.{floating && ' Floating metal is compared in the soil as given only.'}
        {ground !== null &&
          ' The seasons change the best fit; what the readings leave open is told for the soil as given only.'}
      </Say>
    </Part>
  );
}
