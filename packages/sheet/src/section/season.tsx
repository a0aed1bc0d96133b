// Season: the soil in its other states, and which of them governs.
import type { EnvelopeCase, Outcome, SeasonResult } from '@ohmstead/study';
import { Fragment, type VNode } from 'preact';
import type { Desk } from '../desk/desk.ts';
import { itemsOf } from '../desk/json.ts';
import { seasonsWithOneMore, solvedIndex } from '../desk/study-edits.ts';
import { useDesk } from '../desk/use-desk.ts';
import { Pasting } from '../field/pasting.tsx';
import { WordButton } from '../field/word-button.tsx';
import { fixed, quantity } from '../format/number.ts';
import { measuredTold, type Told } from '../format/told.ts';
import { countWord, tally } from '../format/words.ts';
import { AS_GIVEN, seasonRows } from '../verdict/season-rows.ts';
import { Layers } from './layers.tsx';
import { Part } from './part.tsx';
import { CaseName, DataTable, Say } from './parts.tsx';
import { Compared, ResultOf } from './result.tsx';
import { SeasonFields } from './season-fields.tsx';
import { VerdictTable } from './verdict-table.tsx';

function seasonNamed({ results }: Outcome, name: string): SeasonResult | undefined {
  return results.seasons.find((season) => season.name === name);
}

/** Resistance in a season; that of the soil as given under its own name. */
function resistanceIn(of: Outcome, name: string): Told | undefined {
  const found = name === AS_GIVEN ? of.results.electrode : seasonNamed(of, name);
  return found && measuredTold(found.resistance_ohm, found.resistance_uncertainty_ohm, 'Ω');
}

/** What a season makes of the soil and the resistance. */
function Solved({ outcome, season }: { outcome: Outcome; season: SeasonResult }): VNode {
  return (
    <>
      <Layers
        layers={season.layers}
        origin={outcome.results.ground === null ? 'from stated' : 'from fitted'}
      />
      . The resistance is <ResultOf outcome={outcome} told={(of) => resistanceIn(of, season.name)} />
      {`, the covering factor ${fixed(season.covering_factor, 3)}`}.
    </>
  );
}

/** The seasons of the draft, each with what was solved of it. */
function LiveSeasons({ desk, outcome }: { desk: Desk; outcome: Outcome | undefined }): VNode {
  const stated = desk.valueAt(['seasons']);
  const seasons = itemsOf(stated);
  const solved = outcome?.results.seasons ?? [];
  return (
    <Pasting table="seasons" rows="seasons with their name, depth and resistivity, under headings">
      {seasons.length === 0 && <Say>The soil is solved as given; no other season of it is stated.</Say>}
      {seasons.map((_, index) => {
        const season = solved[solvedIndex(seasons, index, solved) ?? -1];
        return (
          <SeasonFields key={index} desk={desk} index={index}>
            {outcome !== undefined && season !== undefined && <Solved outcome={outcome} season={season} />}
          </SeasonFields>
        );
      })}
      <Say>
        <WordButton press={() => desk.edit(['seasons'], seasonsWithOneMore(stated))}>add a season</WordButton>
      </Say>
    </Pasting>
  );
}

function governs(given: EnvelopeCase): string {
  const touch = given.touch.season;
  const step = given.step.season;
  const who =
    touch === step ? `${touch} governs touch and step` : `${touch} governs touch, ${step} governs step`;
  return `${who}; the rise is highest in ${given.gpr.season}, ${quantity(given.gpr.gpr_V, 'V')}.`;
}

/** Rise of a case in a season. */
function riseIn(of: Outcome, name: string, caseName: string): Told | undefined {
  const cases = name === AS_GIVEN ? of.results.cases : (seasonNamed(of, name)?.cases ?? []);
  const found = cases.find((one) => one.name === caseName);
  return found && measuredTold(found.gpr_V, found.gpr_uncertainty_V, 'V');
}

/** Resistance and rise by season, the highest rise of each case marked. */
function RiseTable({ outcome }: { outcome: Outcome }): VNode {
  const { cases, seasons, envelope } = outcome.results;
  return (
    <DataTable
      caption="Resistance and rise by season"
      columns={[
        { label: 'season' },
        { label: 'resistance', align: 'right' },
        ...cases.map((of) => ({ label: `rise, ${of.name}`, align: 'right' as const })),
      ]}
      rows={[AS_GIVEN, ...seasons.map((season) => season.name)].map((name) => [
        name,
        <Compared key={name} outcome={outcome} told={(of) => resistanceIn(of, name)} />,
        ...cases.map((of, k) => (
          <Fragment key={of.name}>
            <Compared outcome={outcome} told={(one) => riseIn(one, name, of.name)} />
            {envelope[k]?.gpr.season === name && ', highest'}
          </Fragment>
        )),
      ])}
      file="seasons.csv"
    />
  );
}

/** What governs, and every voltage in every season against its limit. */
function Governing({ outcome }: { outcome: Outcome }): VNode {
  const before = useDesk()?.before;
  const { envelope, electrodes, ground } = outcome.results;
  const floating = electrodes.some((metal) => metal.role === 'floating');
  return (
    <>
      {envelope.map((given) => (
        <Say key={given.name}>
          <CaseName name={given.name} />: {governs(given)}
        </Say>
      ))}
      <VerdictTable
        rows={seasonRows(outcome.results)}
        pinned={before === undefined ? undefined : seasonRows(before.results)}
        caption="Each case in each season against the limit of that season; the smallest margin governs"
        id="season"
        file="seasons.csv"
        bySeason
      />
      <RiseTable outcome={outcome} />
      <Say>
        The maps show the soil as given.{floating && ' Floating metal is compared in the soil as given only.'}
        {ground !== null &&
          ' The seasons change the best fit; what the readings leave open is told for the soil as given only.'}
      </Say>
    </>
  );
}

/** Other states of the soil; absent from a frozen sheet where the study names none. */
export function Season({ outcome }: { outcome: Outcome | undefined }): VNode | null {
  const desk = useDesk();
  const seasons = outcome?.results.seasons ?? [];
  if (desk === undefined && seasons.length === 0) return null;
  const facts = outcome === undefined ? [] : [tally(seasons.length, 'other season')];
  return (
    <Part id="season" title="Season" facts={facts} outcome={outcome}>
      {seasons.length > 0 && (
        <Say>
          The soil was solved in {countWord(seasons.length)} more {seasons.length === 1 ? 'state' : 'states'}.
          What governs a case is its smallest margin over all of them, not its largest voltage: the limits
          change with the soil under the covering too.
        </Say>
      )}
      {desk !== undefined && <LiveSeasons desk={desk} outcome={outcome} />}
      {desk === undefined &&
        outcome !== undefined &&
        seasons.map((season) => (
          <Say key={season.name}>
            <CaseName name={season.name} />: <Solved outcome={outcome} season={season} />
          </Say>
        ))}
      {outcome !== undefined && seasons.length > 0 && <Governing outcome={outcome} />}
    </Part>
  );
}
