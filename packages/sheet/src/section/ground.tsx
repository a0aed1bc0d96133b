// Ground: the layers of the soil, the readings behind them, and what covers them.
import type { DisplayUnits, Outcome } from '@ohmstead/study';
import type { VNode } from 'preact';
import type { Desk } from '../desk/desk.ts';
import { useDesk } from '../desk/use-desk.ts';
import { useUnits } from '../desk/use-units.ts';
import { GroundFigure } from '../figure/ground.tsx';
import { titles } from '../figure/titles.ts';
import { fitted } from '../format/fitted.ts';
import { givenIn, lengthUnit } from '../format/length.ts';
import { given } from '../format/number.ts';
import { quantityText } from '../format/quantity-text.ts';
import { tally } from '../format/words.ts';
import { Covering } from './covering.tsx';
import { Layers } from './layers.tsx';
import { Part } from './part.tsx';
import { DataTable, FigureBlock, Say } from './parts.tsx';
import { StatedSoil, UnfittedSurvey } from './soil-fields.tsx';
import { Survey } from './survey.tsx';
import { surveyFacts } from './survey-words.ts';

function LayerTable({ outcome, units }: { outcome: Outcome; units: DisplayUnits }): VNode {
  const isGiven = outcome.results.ground === null;
  const unit = lengthUnit(units);
  const length = (metres: number): string => (isGiven ? givenIn(metres, unit) : fitted(metres / unit.metres));
  let top = 0;
  const rows = outcome.results.soil.layers.map((layer, k) => {
    const row = [
      String(k + 1),
      top === 0 ? '0' : length(top),
      layer.thickness_m === null ? 'to any depth' : length(layer.thickness_m),
      isGiven ? given(layer.resistivity_ohm_m) : fitted(layer.resistivity_ohm_m),
    ];
    top += layer.thickness_m ?? 0;
    return row;
  });
  return (
    <DataTable
      caption="Layers of the soil"
      columns={[
        { label: 'layer' },
        { label: `top, ${unit.sign}`, align: 'right' },
        { label: `thickness, ${unit.sign}`, align: 'right' },
        { label: 'resistivity, Ω·m', align: 'right' },
      ]}
      rows={rows}
      file="soil.csv"
    />
  );
}

/** The soil of the draft, with what was fitted to its readings where that is known. */
function LiveSoil({ desk, outcome }: { desk: Desk; outcome: Outcome | undefined }): VNode {
  if (desk.valueAt(['soil', 'survey']) === undefined) return <StatedSoil desk={desk} />;
  const fit = outcome?.results.ground?.fit;
  return outcome === undefined || fit === undefined ? (
    <UnfittedSurvey desk={desk} />
  ) : (
    <Survey outcome={outcome} fit={fit} />
  );
}

function Soil({ outcome }: { outcome: Outcome }): VNode {
  const { soil, ground } = outcome.results;
  if (ground !== null) return <Survey outcome={outcome} fit={ground.fit} />;
  return (
    <Say>
      <Layers layers={soil.layers} origin="stated" />.
    </Say>
  );
}

function factsOf({ results }: Outcome, units: DisplayUnits): readonly string[] {
  const { soil, limits, ground } = results;
  return [
    ...(ground === null ? [] : surveyFacts(ground.fit)),
    soil.layers.length === 1 ? 'uniform soil' : tally(soil.layers.length, 'layer'),
    limits.surfacing_thickness_m === null
      ? 'no covering'
      : `covering ${quantityText('thickness', limits.surfacing_thickness_m, units)}`,
  ];
}

/** Soil layers or the survey they are fitted to, and the covering; without an outcome only what is asked. */
export function Ground({ outcome }: { outcome: Outcome | undefined }): VNode {
  const desk = useDesk();
  const units = useUnits();
  return (
    <Part
      id="ground"
      title="Ground"
      facts={outcome === undefined ? [] : factsOf(outcome, units)}
      outcome={outcome}
    >
      {desk !== undefined && <LiveSoil desk={desk} outcome={outcome} />}
      {desk === undefined && outcome !== undefined && <Soil outcome={outcome} />}
      <Covering outcome={outcome} />
      {outcome !== undefined && (
        <FigureBlock
          name="ground-section"
          title={titles.ground}
          caption="The electrode seen from the side, every conductor projected on the section. Floating metal is dashed."
          table={<LayerTable outcome={outcome} units={units} />}
          by={[outcome, units]}
        >
          <GroundFigure outcome={outcome} name="ground-section" title={titles.ground} />
        </FigureBlock>
      )}
    </Part>
  );
}
