// Surface: potential, touch and step voltage over the plan, and the profile through the worst place.
import type { Outcome } from '@ohmstead/study';
import type { VNode } from 'preact';
import { useDesk } from '../desk/use-desk.ts';
import { useUnits } from '../desk/use-units.ts';
import { MapFigure } from '../figure/map.tsx';
import { ProfileFigure } from '../figure/profile.tsx';
import { titles } from '../figure/titles.ts';
import { fixedLength, lengthUnit, place } from '../format/length.ts';
import { fixed, percent, quantity } from '../format/number.ts';
import { uniqueSlugs } from '../format/slug.ts';
import { tally } from '../format/words.ts';
import type { MapKind } from '../geometry/map-drawing.ts';
import { profileDrawing } from '../geometry/profile-drawing.ts';
import { governingCase } from '../verdict/rows.ts';
import { DifferenceBlock } from './difference-block.tsx';
import { Kept } from './kept.tsx';
import { limitText, mapCaption, otherLimit } from './map-caption.ts';
import { MapTable } from './map-table.tsx';
import { Part } from './part.tsx';
import { CaseName, DataTable, FigureBlock, Say } from './parts.tsx';

/** Rows of a profile's table on the sheet, about; the table file has every point. */
const PROFILE_ROWS = 24;

interface MapBlockProps {
  readonly outcome: Outcome;
  readonly caseIndex: number;
  readonly kind: MapKind;
  readonly slug: string;
  readonly small?: boolean;
}

function MapBlock({ outcome, caseIndex, kind, slug, small = false }: MapBlockProps): VNode {
  const units = useUnits();
  const of = outcome.results.cases[caseIndex];
  const name = `${kind}-${slug}`;
  const title = titles[kind](of.name);
  const caption = small
    ? `Share of the limit of ${quantity(of.touch.limit_V, 'V')}; the worst is ${percent(of.touch.worst_V / of.touch.limit_V)} of it.`
    : mapCaption(outcome, caseIndex, kind, units);
  return (
    <FigureBlock
      name={name}
      title={title}
      caption={caption}
      table={<MapTable outcome={outcome} caseIndex={caseIndex} kind={kind} />}
      by={[outcome, caseIndex, units]}
    >
      <MapFigure
        outcome={outcome}
        caseIndex={caseIndex}
        kind={kind}
        name={name}
        title={title}
        small={small}
      />
    </FigureBlock>
  );
}

function ProfileTable({
  outcome,
  caseIndex,
  file,
}: {
  outcome: Outcome;
  caseIndex: number;
  file: string;
}): VNode {
  const units = useUnits();
  const { profile } = outcome.cases[caseIndex];
  const count = profile.distance.length;
  const stride = Math.max(1, Math.ceil(count / PROFILE_ROWS));
  const rows = Array.from({ length: Math.ceil(count / stride) }, (_, k) => k * stride).map((k) => [
    fixedLength(profile.distance[k], 1, units),
    fixed(profile.potential[k], 0),
    fixed(profile.potential[k] + profile.touch[k], 0),
    fixed(profile.touch[k], 0),
  ]);
  return (
    <DataTable
      caption={`Profile from ${place(profile.from[0], profile.from[1], units)} to ${place(profile.to[0], profile.to[1], units)}`}
      columns={[
        { label: `distance, ${lengthUnit(units).sign}`, align: 'right' },
        { label: 'surface, V', align: 'right' },
        { label: 'metal, V', align: 'right' },
        { label: 'touch, V', align: 'right' },
      ]}
      rows={rows}
      file={file}
    />
  );
}

function ProfileBlock({
  outcome,
  caseIndex,
  slug,
}: {
  outcome: Outcome;
  caseIndex: number;
  slug: string;
}): VNode {
  const of = outcome.results.cases[caseIndex];
  const name = `profile-${slug}`;
  const title = titles.profile(of.name);
  const beyond =
    profileDrawing(outcome, caseIndex).beyond.length > 0 ? ' Hatched: touch voltage beyond the limit.' : '';
  return (
    <FigureBlock
      name={name}
      title={title}
      caption={`Touch voltage is the distance from the surface up to the metal; the broken line lies the limit of ${quantity(of.touch.limit_V, 'V')} below the metal.${beyond} Metal is drawn strong over assessed ground. Dots on the axis: metal that the line passes over.`}
      table={<ProfileTable outcome={outcome} caseIndex={caseIndex} file={`${name}.csv`} />}
      by={[outcome, caseIndex]}
    >
      <ProfileFigure outcome={outcome} caseIndex={caseIndex} name={name} title={title} />
    </FigureBlock>
  );
}

interface InstrumentBlockProps extends Omit<MapBlockProps, 'kind' | 'small'> {
  readonly instrument: VNode;
}

/** The instrument in the place of the maps, with what they tell of the governing case as tables. */
function InstrumentBlock({ outcome, caseIndex, slug, instrument }: InstrumentBlockProps): VNode {
  const units = useUnits();
  const of = outcome.results.cases[caseIndex];
  const kinds: readonly MapKind[] = ['touch', 'step', 'potential'];
  return (
    <FigureBlock
      name={`touch-${slug}`}
      title={titles.surface}
      caption={`Limits of ${of.name}: touch ${limitText(outcome, of, 'touch', units)}; step ${limitText(outcome, of, 'step', units)}.${otherLimit(of, 'touch')}`}
      table={
        <Kept by={[outcome, caseIndex]}>
          {kinds.map((kind) => (
            <MapTable key={kind} outcome={outcome} caseIndex={caseIndex} kind={kind} />
          ))}
        </Kept>
      }
    >
      {instrument}
    </FigureBlock>
  );
}

/** Touch, step and potential of the governing case with its profile, as figures or as one instrument. */
function Governing({
  outcome,
  caseIndex,
  slug,
}: {
  outcome: Outcome;
  caseIndex: number;
  slug: string;
}): VNode {
  const instrument = useDesk()?.instrument?.('surface', outcome);
  const shared = { outcome, caseIndex, slug };
  if (instrument === undefined) {
    return (
      <>
        <MapBlock {...shared} kind="touch" />
        <DifferenceBlock {...shared} />
        <ProfileBlock {...shared} />
        <MapBlock {...shared} kind="step" />
        <MapBlock {...shared} kind="potential" />
      </>
    );
  }
  return (
    <>
      <InstrumentBlock {...shared} instrument={instrument} />
      <DifferenceBlock {...shared} />
      <ProfileBlock {...shared} />
    </>
  );
}

/** Maps of the governing case, touch maps of the others, and the profile. */
export function Surface({ outcome }: { outcome: Outcome }): VNode {
  const { results, cases } = outcome;
  const governing = governingCase(results);
  const slugs = uniqueSlugs(cases.map((c) => c.name));
  const others = cases.map((_, k) => k).filter((k) => k !== governing);
  const error = cases[governing].map.error;
  return (
    <Part
      id="surface"
      title="Surface"
      facts={[`governing case: ${results.cases[governing].name}`, tally(cases.length, 'case')]}
      outcome={outcome}
    >
      <Say>
        The maps show <CaseName name={results.cases[governing].name} />, the case that comes{' '}
        {results.cases[governing].touch.within_limit && results.cases[governing].step.within_limit
          ? 'nearest to'
          : 'farthest beyond'}{' '}
        a limit{results.seasons.length > 0 ? ' in the soil as given' : ''}. Between computed points they are
        good to about {quantity(error, 'V', 2)}; the worst places are searched for apart and not read from the
        map.
      </Say>
      <Governing outcome={outcome} caseIndex={governing} slug={slugs[governing]} />
      {others.length > 0 && (
        <div class="side-by-side">
          {others.map((k) => (
            <MapBlock key={k} outcome={outcome} caseIndex={k} kind="touch" slug={slugs[k]} small />
          ))}
        </div>
      )}
    </Part>
  );
}
