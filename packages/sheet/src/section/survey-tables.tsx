// The tables of a survey: layers with their spread, readings with their misfit, numbers of layers tried, the curve.
import type { SoilFit, Spread } from '@ohmstead/study';
import type { VNode } from 'preact';
import { useUnits } from '../desk/use-units.ts';
import { band, fitted, misfitPercent, outsideBand } from '../format/fitted.ts';
import { surveyedNumber } from '../format/fitted-length.ts';
import { lengthUnit } from '../format/length.ts';
import { fixed } from '../format/number.ts';
import { capital } from '../format/words.ts';
import { DataTable } from './parts.tsx';
import { thicknessBand } from './survey-words.ts';

/** Sign behind a best fit that its band does not hold. */
const OUTSIDE = '\u202f*';

/** @param unit in which it is told, SI units */
function best(of: Spread, unit: number = 1): string {
  return `${fitted(of.best / unit)}${outsideBand(of) ? OUTSIDE : ''}`;
}

/** Layers as best fit, median and band. */
export function LayerTable({ fit }: { fit: SoilFit }): VNode {
  const units = useUnits();
  const { sign, metres } = lengthUnit(units);
  const outside = fit.layers.some(
    ({ resistivity_ohm_m: rho, thickness_m }) =>
      outsideBand(rho) || (thickness_m !== null && outsideBand(thickness_m)),
  );
  return (
    <DataTable
      caption={`Fitted layers, and their spread over the soils that the readings allow${outside ? '; * outside the band' : ''}`}
      columns={[
        { label: 'layer' },
        { label: 'resistivity, Ω·m', align: 'right' },
        { label: 'median', align: 'right' },
        { label: '5–95\u202f%', align: 'right' },
        { label: `thickness, ${sign}`, align: 'right' },
        { label: 'median', align: 'right' },
        { label: '5–95\u202f%', align: 'right' },
      ]}
      rows={fit.layers.map((layer, k) => {
        const { resistivity_ohm_m: rho, thickness_m: thick } = layer;
        return [
          String(k + 1),
          best(rho),
          fitted(rho.median),
          band(rho),
          thick === null ? '' : best(thick, metres),
          thick === null ? '' : fitted(thick.median / metres),
          thicknessBand(layer, units),
        ];
      })}
      file="ground-layers.csv"
    />
  );
}

/** Every reading beside the model. */
export function ReadingTable({ fit }: { fit: SoilFit }): VNode {
  const units = useUnits();
  return (
    <DataTable
      caption={`Readings of ${fit.survey_file} beside the model`}
      columns={[
        { label: 'line' },
        { label: 'traverse' },
        { label: `spacing, ${lengthUnit(units).sign}`, align: 'right' },
        { label: 'read, Ω·m', align: 'right' },
        { label: 'model, Ω·m', align: 'right' },
        { label: 'model/read − 1, %', align: 'right' },
        { label: 'remark' },
      ]}
      rows={fit.readings.map((reading) => [
        String(reading.line),
        reading.traverse === '' ? '—' : reading.traverse,
        surveyedNumber(reading.spacing_m, units),
        fitted(reading.apparent_resistivity_ohm_m),
        fitted(reading.model_ohm_m),
        misfitPercent(reading.misfit_percent),
        reading.outlier ? 'outlier' : '',
      ])}
      file="ground-readings.csv"
    />
  );
}

/** Rows of the curve on the sheet, about; the table file has every point. */
const CURVE_ROWS = 14;

/** The fitted curve and its band. */
export function CurveTable({ fit }: { fit: SoilFit }): VNode {
  const { sign, metres } = lengthUnit(useUnits());
  const stride = Math.max(1, Math.ceil(fit.sounding.length / CURVE_ROWS));
  return (
    <DataTable
      caption="Apparent resistivity of the fit and of the soils"
      columns={[
        { label: `spacing, ${sign}`, align: 'right' },
        { label: 'best fit, Ω·m', align: 'right' },
        { label: '5–95\u202f% of the soils, Ω·m', align: 'right' },
      ]}
      rows={fit.sounding
        .filter((_, k) => k % stride === 0)
        .map((point) => [
          fitted(point.spacing_m / metres),
          fitted(point.fitted_ohm_m),
          band({ low: point.low_ohm_m, high: point.high_ohm_m }),
        ])}
      file="sounding.csv"
    />
  );
}

/** Each number of layers that was tried, and the criterion that chooses. */
export function TrialTable({ fit }: { fit: SoilFit }): VNode {
  const remark = (count: number): string =>
    [count === fit.layer_count_proposed ? 'proposed' : '', count === fit.layer_count ? 'taken' : '']
      .filter((word) => word !== '')
      .join(', ');
  return (
    <>
      <DataTable
        caption="Numbers of layers that were tried; a lower criterion is better"
        columns={[
          { label: 'layers' },
          { label: 'misfit, %', align: 'right' },
          { label: 'criterion', align: 'right' },
          { label: 'remark' },
        ]}
        rows={fit.trials.map((trial) => [
          String(trial.layer_count),
          fixed(trial.rms_percent, 1),
          fixed(trial.criterion, 1),
          remark(trial.layer_count),
        ])}
        file="ground-trials.csv"
      />
      <div class="clause">{capital(fit.layer_count_criterion)}</div>
    </>
  );
}
