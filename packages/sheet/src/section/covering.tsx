// The covering of the soil: what it is, where it lies, and by which factor it bears on people.
import type { Outcome } from '@ohmstead/study';
import type { ComponentChildren, VNode } from 'preact';
import type { Desk } from '../desk/desk.ts';
import { useDesk } from '../desk/use-desk.ts';
import { QuantityInput } from '../field/inputs.tsx';
import { WordButton } from '../field/word-button.tsx';
import { givenQuantity, significant } from '../format/number.ts';
import { fixedTold } from '../format/told.ts';
import { CLAUSES, CoveringFormula, S } from './formulas.tsx';
import { How } from './how.tsx';
import { originOf, soilResistivity } from './layers.tsx';
import { Say } from './parts.tsx';
import { ResultOf } from './result.tsx';

interface StatedProps {
  readonly resistivity?: number;
  readonly thickness?: number;
  readonly areasGiven: boolean;
  readonly children?: ComponentChildren;
}

function Stated({ resistivity, thickness, areasGiven, children }: StatedProps): VNode {
  return (
    <Say>
      A covering of{' '}
      <QuantityInput
        path={['surfacing', 'resistivity_ohm_m']}
        kind="resistivity"
        label="resistivity of the covering"
        value={resistivity}
      />
      ,{' '}
      <QuantityInput
        path={['surfacing', 'thickness_m']}
        kind="thickness"
        label="thickness of the covering"
        value={thickness}
      />{' '}
      thick, lies {areasGiven ? 'in the areas given' : 'over the area where touch voltage is assessed'}.
      {children}
    </Say>
  );
}

function Factor({ outcome }: { outcome: Outcome }): VNode | null {
  const { limits } = outcome.results;
  const { surfacing_resistivity_ohm_m: resistivity, surfacing_thickness_m: thickness } = limits;
  if (resistivity === null || thickness === null) return null;
  return (
    <>
      {' '}
      It bears on what people tolerate there by the factor{' '}
      <ResultOf outcome={outcome} told={({ results }) => fixedTold(results.limits.covering_factor, 3)} />, not
      on the rise.
      <How
        of="the covering factor is found"
        formula={<CoveringFormula />}
        clause={CLAUSES.covering}
        inputs={[
          {
            symbol: <S of="ρ" />,
            name: 'soil under the covering',
            value: soilResistivity(limits.soil_resistivity_ohm_m, originOf(outcome.results)),
          },
          { symbol: <S of="ρ" index="s" />, name: 'covering', value: givenQuantity(resistivity, 'Ω·m') },
          {
            /* the formula takes metres, whatever lengths are displayed in */
            symbol: <S of="h" index="s" />,
            name: 'thickness of the covering',
            value: givenQuantity(thickness, 'm'),
          },
        ]}
        value={significant(limits.covering_factor, 4)}
      />
    </>
  );
}

const BARE = 'No covering is stated: people stand on the soil itself, and the covering factor is 1.';

function LiveCovering({ desk, outcome }: { desk: Desk; outcome: Outcome | undefined }): VNode {
  if (desk.valueAt(['surfacing']) === undefined) {
    return (
      <Say>
        {BARE}
        <span class="edits">
          <WordButton press={() => desk.edit(['surfacing'], {})}>state a covering</WordButton>
        </span>
      </Say>
    );
  }
  return (
    <Stated areasGiven={desk.valueAt(['surfacing', 'areas']) !== undefined}>
      {outcome !== undefined && <Factor outcome={outcome} />}
      <span class="edits">
        <WordButton press={() => desk.edit(['surfacing'], undefined)} vanishes>
          remove the covering
        </WordButton>
      </span>
    </Stated>
  );
}

/** The covering as stated, or that there is none. */
export function Covering({ outcome }: { outcome: Outcome | undefined }): VNode {
  const desk = useDesk();
  if (desk !== undefined) return <LiveCovering desk={desk} outcome={outcome} />;
  const limits = outcome?.results.limits;
  if (limits?.surfacing_resistivity_ohm_m == null || limits.surfacing_thickness_m === null)
    return <Say>{BARE}</Say>;
  return (
    <Stated
      resistivity={limits.surfacing_resistivity_ohm_m}
      thickness={limits.surfacing_thickness_m}
      areasGiven={outcome?.study.surfacing?.areas !== undefined}
    >
      {outcome !== undefined && <Factor outcome={outcome} />}
    </Stated>
  );
}
