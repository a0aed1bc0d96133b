// Every figure of a sheet as a file of its own.
import type { Outcome } from '@ohmstead/study';
import type { VNode } from 'preact';
import { renderToString } from 'preact-render-to-string';
import { UnitsContext } from '../desk/use-units.ts';
import { uniqueSlugs } from '../format/slug.ts';
import { diagonalOf } from '../geometry/electrode-size.ts';
import type { MapKind } from '../geometry/map-drawing.ts';
import { verdictRows } from '../verdict/rows.ts';
import { seasonRows } from '../verdict/season-rows.ts';
import { soilBandRows } from '../verdict/soil-band.ts';
import { BarsFigure } from './bars.tsx';
import { GroundFigure } from './ground.tsx';
import { LeakageFigure } from './leakage.tsx';
import { MapFigure } from './map.tsx';
import { PlanFigure } from './plan.tsx';
import { ProfileFigure } from './profile.tsx';
import { SoilBandsFigure } from './soil-bands.tsx';
import { SoundingFigure } from './sounding.tsx';
import { standaloneCss } from './style.ts';
import { titles } from './titles.ts';
import { xmlText } from './xml-text.ts';

export interface FigureFile {
  /** ends in `.svg`, unique within the list */
  readonly name: string;
  readonly svg: string;
}

const MAP_KINDS: readonly MapKind[] = ['potential', 'step', 'touch'];

/**
 * Every figure as an SVG document with its own styles, title and description, sorted by name: plan, ground, leakage,
 * bars against the limits, and for each case the maps of potential, touch and step and the profile; where the soil was
 * fitted to readings the sounding and what they leave open; where there are seasons, bars by season.
 * @param outcome of a solved study
 * @returns files named by kind and case, e.g. `touch-33-kv-bus.svg`; the same outcome gives the same bytes
 */
export function figures(outcome: Outcome): readonly FigureFile[] {
  const css = standaloneCss();
  const units = outcome.study.display_units ?? 'SI';
  const inUnits = (figure: VNode): VNode => (
    <UnitsContext.Provider value={units}>{figure}</UnitsContext.Provider>
  );
  const drawn = new Map<string, VNode>();
  const add = (name: string, draw: (name: string) => VNode): void => {
    drawn.set(name, draw(name));
  };
  add('electrode-plan', (name) => <PlanFigure outcome={outcome} name={name} title={titles.plan} css={css} />);
  add('ground-section', (name) => (
    <GroundFigure outcome={outcome} name={name} title={titles.ground} css={css} />
  ));
  add('leakage', (name) => <LeakageFigure outcome={outcome} name={name} title={titles.leakage} css={css} />);
  add('limits', (name) => (
    <BarsFigure rows={verdictRows(outcome.results)} name={name} title={titles.limits} css={css} />
  ));
  const { ground, seasons } = outcome.results;
  if (ground !== null) {
    const { fit } = ground;
    add('sounding', (name) => (
      <SoundingFigure
        fit={fit}
        diagonal={diagonalOf(outcome.plan.conductors)}
        name={name}
        title={titles.sounding}
        css={css}
      />
    ));
    add('ground-consequence', (name) => (
      <SoilBandsFigure rows={soilBandRows(outcome.results)} name={name} title={titles.soilBands} css={css} />
    ));
  }
  if (seasons.length > 0) {
    add('seasons', (name) => (
      <BarsFigure rows={seasonRows(outcome.results)} name={name} title={titles.seasons} css={css} />
    ));
  }
  uniqueSlugs(outcome.cases.map((c) => c.name)).forEach((of, caseIndex) => {
    for (const kind of MAP_KINDS) {
      const title = titles[kind](outcome.cases[caseIndex].name);
      add(`${kind}-${of}`, (name) => (
        <MapFigure
          outcome={outcome}
          caseIndex={caseIndex}
          kind={kind}
          name={name}
          title={title}
          small={false}
          css={css}
        />
      ));
    }
    const title = titles.profile(outcome.cases[caseIndex].name);
    add(`profile-${of}`, (name) => (
      <ProfileFigure outcome={outcome} caseIndex={caseIndex} name={name} title={title} css={css} />
    ));
  });
  return [...drawn]
    .sort(([a], [b]) => (a < b ? -1 : 1))
    .map(([name, figure]) => ({ name: `${name}.svg`, svg: `${xmlText(renderToString(inUnits(figure)))}\n` }));
}
