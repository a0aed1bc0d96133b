// Ground: the layers of the soil, the readings behind them, and what covers them.
import type { Outcome } from '@ohmstead/study';
import type { VNode } from 'preact';
import { GroundFigure } from '../figure/ground.tsx';
import { titles } from '../figure/titles.ts';
import { fitted } from '../format/fitted.ts';
import { fixed, given, givenQuantity, significant } from '../format/number.ts';
import { tally } from '../format/words.ts';
import { CLAUSES, CoveringFormula, S } from './formulas.tsx';
import { How } from './how.tsx';
import { Layers, originOf, soilQuantity } from './layers.tsx';
import { DataTable, FigureBlock, Input, Part, Result, Say } from './parts.tsx';
import { Survey } from './survey.tsx';
import { surveyFacts } from './survey-words.ts';

function Covering({ outcome }: { outcome: Outcome }): VNode {
  const { limits } = outcome.results;
  const { surfacing_resistivity_ohm_m: resistivity, surfacing_thickness_m: thickness } = limits;
  if (resistivity === null || thickness === null) {
    return <Say>No covering is stated: people stand on the soil itself, and the covering factor is 1.</Say>;
  }
  return (
    <Say>
      A covering of <Input path="surfacing.resistivity_ohm_m" value={resistivity} unit="Ω·m" />,{' '}
      <Input path="surfacing.thickness_m" value={thickness} unit="m" /> thick, lies{' '}
      {outcome.study.surfacing?.areas === undefined
        ? 'over the area where touch voltage is assessed'
        : 'in the areas given'}
      . It bears on what people tolerate there by the factor{' '}
      <Result>{fixed(limits.covering_factor, 3)}</Result>, not on the rise.
      <How
        of="the covering factor is found"
        formula={<CoveringFormula />}
        clause={CLAUSES.covering}
        inputs={[
          {
            symbol: <S of="ρ" />,
            name: 'soil under the covering',
            value: soilQuantity(limits.soil_resistivity_ohm_m, 'Ω·m', originOf(outcome.results)),
          },
          { symbol: <S of="ρ" index="s" />, name: 'covering', value: givenQuantity(resistivity, 'Ω·m') },
          {
            symbol: <S of="h" index="s" />,
            name: 'thickness of the covering',
            value: givenQuantity(thickness, 'm'),
          },
        ]}
        value={significant(limits.covering_factor, 4)}
      />
    </Say>
  );
}

function layerTable(outcome: Outcome): VNode {
  const told = outcome.results.ground === null ? given : fitted;
  let top = 0;
  const rows = outcome.results.soil.layers.map((layer, k) => {
    const row = [
      String(k + 1),
      top === 0 ? '0' : told(top),
      layer.thickness_m === null ? 'to any depth' : told(layer.thickness_m),
      told(layer.resistivity_ohm_m),
    ];
    top += layer.thickness_m ?? 0;
    return row;
  });
  return (
    <DataTable
      caption="Layers of the soil"
      columns={[
        { label: 'layer' },
        { label: 'top, m', align: 'right' },
        { label: 'thickness, m', align: 'right' },
        { label: 'resistivity, Ω·m', align: 'right' },
      ]}
      rows={rows}
    />
  );
}

/** Soil layers or the survey they are fitted to, and the covering. */
export function Ground({ outcome }: { outcome: Outcome }): VNode {
  const { soil, limits, ground } = outcome.results;
  const facts = [
    ...(ground === null ? [] : surveyFacts(ground.fit)),
    soil.layers.length === 1 ? 'uniform soil' : tally(soil.layers.length, 'layer'),
    limits.surfacing_thickness_m === null
      ? 'no covering'
      : `covering ${givenQuantity(limits.surfacing_thickness_m, 'm')}`,
  ];
  return (
    <Part id="ground" title="Ground" facts={facts}>
      {ground === null ? (
        <Say>
          <Layers layers={soil.layers} origin="stated" />.
        </Say>
      ) : (
        <Survey outcome={outcome} fit={ground.fit} />
      )}
      <Covering outcome={outcome} />
      <FigureBlock
        name="ground-section"
        title={titles.ground}
        caption="The electrode seen from the side, every conductor projected on the section. Floating metal is dashed."
        table={layerTable(outcome)}
      >
        <GroundFigure outcome={outcome} name="ground-section" title={titles.ground} />
      </FigureBlock>
    </Part>
  );
}
