// The survey as part of the ground: what was read, what was fitted, what stays open, and what to mind.
import type { Outcome, SoilFit } from '@ohmstead/study';
import type { VNode } from 'preact';
import { useUnits } from '../desk/use-units.ts';
import { Stated } from '../field/inputs.tsx';
import { SoundingFigure } from '../figure/sounding.tsx';
import { titles } from '../figure/titles.ts';
import { fitted } from '../format/fitted.ts';
import { percent } from '../format/number.ts';
import { capital, counted, countWord, listed } from '../format/words.ts';
import { diagonalOf, shallowestOf } from '../geometry/electrode-size.ts';
import { soundingDrawing } from '../geometry/sounding-drawing.ts';
import { Layers } from './layers.tsx';
import { FigureBlock, Fold, Result, Say } from './parts.tsx';
import { Remarks } from './remarks.tsx';
import { LayerCount } from './soil-fields.tsx';
import { CurveTable, LayerTable, ReadingTable, TrialTable } from './survey-tables.tsx';
import {
  allowedSentence,
  choiceWords,
  depthSentence,
  endingWords,
  FIELD_CAUTIONS,
  outsideSentence,
  shortSpacingSentence,
  spacingRange,
  traverseCount,
} from './survey-words.ts';

function Read({ outcome, fit }: { outcome: Outcome; fit: SoilFit }): VNode {
  const units = useUnits();
  const traverses = traverseCount(fit);
  return (
    <Say>
      The soil is fitted to {counted(fit.readings.length, 'reading')}
      {traverses > 1 && ` on ${countWord(traverses)} traverses`} in{' '}
      <Stated path={['soil', 'survey']} text={outcome.study.soil.survey ?? fit.survey_file} />, at spacings
      from {spacingRange(fit, units)}. <Layers layers={outcome.results.soil.layers} origin="fitted" />.
    </Say>
  );
}

function Fitted({ outcome, fit }: { outcome: Outcome; fit: SoilFit }): VNode {
  const asked = outcome.study.soil.layer_count;
  return (
    <Say>
      {endingWords(fit.outcome)}; it misses the readings by <Result>{percent(fit.rms_percent / 100)}</Result>{' '}
      (root mean square). The number of layers, <LayerCount asked={asked ?? 'auto'} />,{' '}
      {choiceWords(fit, asked)}.{'\u00a0'}
      <Fold label="how" of=" the number of layers is proposed">
        <TrialTable fit={fit} />
      </Fold>
    </Say>
  );
}

function Allowed({ fit }: { fit: SoilFit }): VNode {
  const { count, method, seed } = fit.family;
  const outside = outsideSentence(fit);
  return (
    <Say>
      {allowedSentence(fit, useUnits())} {outside !== undefined && `${outside} `}
      What that does to resistance, rise, touch and step voltage is told beside each of them; it is no part of
      any ±, which is numerical.{'\u00a0'}
      <Fold label="how" of=" the band is found">
        <div>
          {capital(counted(count, 'soil'))} of as many layers that fit within the scatter of the readings make
          the family; nine in ten of them lie in its band of 5–95{'\u202f'}%.
        </div>
        <div class="clause">{`${capital(method)}; seed ${seed}.`}</div>
      </Fold>
    </Say>
  );
}

function Depth({ outcome, fit }: { outcome: Outcome; fit: SoilFit }): VNode {
  const { conductors } = outcome.plan;
  const units = useUnits();
  const short = shortSpacingSentence(fit, shallowestOf(conductors), units);
  return (
    <Say>
      {depthSentence(fit, diagonalOf(conductors), units)}
      {short !== undefined && ` ${short}`}
      {'\u00a0'}
      <Fold label="how" of=" the depth is found">
        <div class="clause">{capital(fit.resolved_depth_rule)}.</div>
      </Fold>
    </Say>
  );
}

function captionOf(outcome: Outcome, fit: SoilFit): string {
  const { offScale } = soundingDrawing(fit, diagonalOf(outcome.plan.conductors));
  const off =
    offScale.length === 0
      ? ''
      : ` Off the scale: ${listed(offScale.map(fitted))}\u202fΩ·m, where the step line leaves the figure.`;
  const outliers = fit.readings.some((reading) => reading.outlier)
    ? ' Ringed readings stand off the model.'
    : '';
  return `Marks are readings, one shape a traverse; the curve is that of the fit for a Wenner array on the surface, and the tint the 5–95\u202f% of the soils that the readings allow.${outliers} The thin step line is another thing on the same axes: the resistivity of the fitted layers, with depth where spacing stands.${off} The upright lines mark the depth that the readings resolve and the diagonal of the electrode.`;
}

function Sounding({ outcome, fit }: { outcome: Outcome; fit: SoilFit }): VNode {
  return (
    <FigureBlock
      name="sounding"
      by={[outcome]}
      title={titles.sounding}
      caption={captionOf(outcome, fit)}
      table={
        <>
          <ReadingTable fit={fit} />
          <CurveTable fit={fit} />
        </>
      }
    >
      <SoundingFigure
        fit={fit}
        diagonal={diagonalOf(outcome.plan.conductors)}
        name="sounding"
        title={titles.sounding}
      />
    </FigureBlock>
  );
}

/** Readings, fit, what stays open, sounding and tables. */
export function Survey({ outcome, fit }: { outcome: Outcome; fit: SoilFit }): VNode {
  return (
    <>
      <Read outcome={outcome} fit={fit} />
      <Allowed fit={fit} />
      <Fitted outcome={outcome} fit={fit} />
      <Depth outcome={outcome} fit={fit} />
      <LayerTable fit={fit} />
      <Sounding outcome={outcome} fit={fit} />
      {fit.doubts.length > 0 && <Remarks title="Doubts of the fit" remarks={fit.doubts} />}
      <h3>What no reading tells</h3>
      <ul class="cautions">
        {FIELD_CAUTIONS.map((text) => (
          <li key={text}>{text}</li>
        ))}
      </ul>
    </>
  );
}
