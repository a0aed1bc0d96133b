// An outcome whose soil was fitted to readings, from invented data: its numbers are nobody's and test no physics.
import type {
  EquivalentUniform,
  GroundReading,
  GroundResult,
  Outcome,
  SoilFit,
  SoundingPoint,
  Spread,
} from '@ohmstead/study';

export interface GroundOptions {
  readonly traverses?: readonly string[];
  readonly surveyFile?: string;
  /** number of layers that the study asks for */
  readonly asked?: number | 'auto';
  readonly proposed?: number;
  readonly outcome?: string;
  /** ends of the bands of rise, touch and step, and their median, times the best fit */
  readonly low?: number;
  readonly median?: number;
  readonly high?: number;
  /** resistivity of the lower layer at the best fit, Ω·m; the band stays */
  readonly lower?: number;
  readonly doubts?: SoilFit['doubts'];
}

const SPACINGS: readonly number[] = [0.5, 1, 2, 4, 8, 16, 32];
const UPPER = 204.1372;
/** Readings off the curve, per cent, by place; the fourth of the second traverse stands out. */
const SCATTER: readonly number[] = [
  1.2, -2.1, 0.4, 1.9, -1.4, 2.2, -0.8, -1.7, 2.4, 1.1, 14.6, 0.9, -2.6, 1.3,
];

/** From the upper to the lower resistivity with growing spacing; no solution of any soil. */
function curve(upper: number, lower: number, spacing: number): number {
  const share = 1 / (1 + (spacing / 3.4) ** 1.7);
  return lower * (upper / lower) ** share;
}

function readingsOf(traverses: readonly string[], lower: number): readonly GroundReading[] {
  return traverses.flatMap((traverse, t) =>
    SPACINGS.map((spacing_m, k): GroundReading => {
      const at = t * SPACINGS.length + k;
      const model = curve(UPPER, lower, spacing_m);
      const read = model * (1 + SCATTER[at % SCATTER.length] / 100);
      return {
        line: at + 2,
        traverse,
        spacing_m,
        apparent_resistivity_ohm_m: read,
        model_ohm_m: model,
        misfit_percent: 100 * (model / read - 1),
        outlier: Math.abs(model / read - 1) > 0.1,
      };
    }),
  );
}

function soundingOf(lower: number): readonly SoundingPoint[] {
  return Array.from({ length: 24 }, (_, k) => {
    const spacing_m = 0.35 * (48 / 0.35) ** (k / 23);
    return {
      spacing_m,
      fitted_ohm_m: curve(UPPER, lower, spacing_m),
      low_ohm_m: curve(178, 41, spacing_m),
      high_ohm_m: curve(231, 62, spacing_m),
    };
  });
}

function times(best: number, { low = 0.88, median = 1.01, high = 1.17 }: GroundOptions): Spread {
  return { best, low: low * best, median: median * best, high: high * best };
}

/** The outcome with its soil taken as fitted to two traverses of seven readings each. */
export function withGround(outcome: Outcome, options: GroundOptions = {}): Outcome {
  const { results, study } = outcome;
  const {
    traverses = ['north fence', 'access road'],
    lower = 50.6314,
    asked = 'auto',
    proposed = 2,
  } = options;
  const surveyFile = options.surveyFile ?? 'survey.csv';
  const ground: GroundResult = {
    fit: {
      survey_file: surveyFile,
      outcome: options.outcome ?? 'converged',
      layer_count: 2,
      layer_count_proposed: proposed,
      layer_count_criterion: `least made-up criterion: ${proposed}`,
      trials: [
        { layer_count: 1, rms_percent: 61.2, criterion: 12.4 },
        { layer_count: 2, rms_percent: 4.31, criterion: -40.25 },
        { layer_count: 3, rms_percent: 4.02, criterion: -36.7 },
      ],
      rms_percent: 4.31,
      layers: [
        {
          resistivity_ohm_m: { best: UPPER, low: 178, median: 203, high: 231 },
          thickness_m: { best: 2.04, low: 1.72, median: 2.08, high: 2.49 },
        },
        { resistivity_ohm_m: { best: lower, low: 41.2, median: 50.1, high: 61.7 }, thickness_m: null },
      ],
      readings: readingsOf(traverses, lower),
      sounding: soundingOf(lower),
      family: { count: 160, seed: 20_260_101, method: 'made-up draws' },
      resolved_depth_m: 16.6,
      resolved_depth_rule: 'made-up rule of depth',
      doubts: options.doubts ?? [
        { code: 'outliers', message: 'the reading in line 12 stands off the model' },
      ],
    },
    consequence: {
      resistance_ohm: times(results.electrode.resistance_ohm, options),
      cases: results.cases.map((c) => ({
        name: c.name,
        gpr_V: times(c.gpr_V, options),
        touch_V: times(c.touch.worst_V, options),
        step_V: times(c.step.worst_V, options),
      })),
    },
  };
  return {
    ...outcome,
    study: { ...study, soil: { survey: surveyFile, layer_count: asked } },
    results: {
      ...results,
      soil: {
        layers: ground.fit.layers.map((layer) => ({
          resistivity_ohm_m: layer.resistivity_ohm_m.best,
          thickness_m: layer.thickness_m?.best ?? null,
        })),
      },
      limits: { ...results.limits, soil_resistivity_ohm_m: UPPER },
      ground,
    },
  };
}

/** The outcome with hand values of one resistivity. */
export function withEquivalentUniform(outcome: Outcome): Outcome {
  const { resistance_ohm } = outcome.results.electrode;
  const of = (name: string, source: string, resistivity: number, deviation: number): EquivalentUniform => ({
    name,
    source,
    resistivity_ohm_m: resistivity,
    resistance_ohm: resistance_ohm * (1 + deviation / 100),
    deviation_percent: deviation,
  });
  return {
    ...outcome,
    results: {
      ...outcome.results,
      equivalent_uniform: [
        of('mean of the readings', 'made-up handbook, rule 4', 138.3, 33.25),
        of('lower layer alone', 'common practice, no source', 50.6, -27.4),
      ],
    },
  };
}
