// Season: the soil in its other states, and which of them governs.
import type { EnvelopeCase, Outcome, SeasonCase, SeasonResult, WorstTouch } from '@ohmstead/study';
import type { VNode } from 'preact';
import { fixed, measured, percent, quantity } from '../format/number.ts';
import { countWord, tally } from '../format/words.ts';
import { voltageFinding } from '../verdict/finding.ts';
import { Layers } from './layers.tsx';
import { CaseName, DataTable, Part, Result, Say } from './parts.tsx';

function SeasonSoil({ season }: { season: SeasonResult }): VNode {
  return (
    <Say>
      <CaseName name={season.name} />: <Layers layers={season.layers} />. The resistance is{' '}
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

function compared(of: WorstTouch): string {
  const share = of.worst_V / of.limit_V;
  switch (voltageFinding(of)) {
    case 'beyond':
      return `beyond by ${percent(share - 1)}`;
    case 'within':
      return `${percent(1 - share)} margin`;
    case 'undecided':
      return 'undecided';
  }
}

function cells(season: string, of: SeasonCase): readonly string[] {
  return [
    of.name,
    season,
    measured(of.gpr_V, of.gpr_uncertainty_V, 'V'),
    measured(of.touch.worst_V, of.touch.uncertainty_V, 'V'),
    compared(of.touch),
    measured(of.step.worst_V, of.step.uncertainty_V, 'V'),
    compared(of.step),
  ];
}

/** Other states of the soil; absent where the study names none. */
export function Season({ outcome }: { outcome: Outcome }): VNode | null {
  const { seasons, envelope, cases, electrodes } = outcome.results;
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
        <SeasonSoil key={season.name} season={season} />
      ))}
      {envelope.map((given) => (
        <Say key={given.name}>
          <CaseName name={given.name} />: {governs(given)}
        </Say>
      ))}
      <DataTable
        caption="Each case in each season"
        columns={[
          { label: 'case' },
          { label: 'season' },
          { label: 'rise', align: 'right' },
          { label: 'worst touch', align: 'right' },
          { label: 'against its limit' },
          { label: 'worst step', align: 'right' },
          { label: 'against its limit' },
        ]}
        rows={cases.flatMap((of, k) => [
          cells('as given', of),
          ...seasons.map((season) => cells(season.name, season.cases[k])),
        ])}
      />
      <Say>
        The maps show the soil as given.{floating && ' Floating metal is compared in the soil as given only.'}
      </Say>
    </Part>
  );
}
