// A plausible outcome from invented data, for demos of the sheet: its numbers are nobody's and test no physics.
import type {
  CaseFigures,
  CaseMap,
  CaseResult,
  Outcome,
  PlanConductor,
  Point,
  Polygon,
  Results,
  SegmentTable,
} from '@ohmstead/study';
import { type Field, field, fixtureConductors, lengthOf, RODS } from './fixture-metal.ts';

export interface FixtureOptions {
  readonly title?: string;
  readonly caseNames?: readonly string[];
  /** fault current of each case, A */
  readonly currents?: readonly number[];
  /** lattice spacing of the maps, m */
  readonly spacing?: number;
  /** half width of the band on the worst voltages, share of them */
  readonly uncertainty?: number;
  readonly fenceName?: string;
}

const DECREMENT = 1.026;
const DIVISION = 0.6;
const DURATIONS: readonly number[] = [0.5, 0.5, 1];
const NAMES: readonly string[] = ['33 kV bus', '33 kV line end', '11 kV side'];
const TOUCH_AREA: Polygon = [
  [0, 0],
  [60, 0],
  [60, 18],
  [36, 18],
  [36, 45],
  [0, 45],
];
const STEP_AREA: Polygon = [
  [-3, -3],
  [63, -3],
  [63, 21],
  [39, 21],
  [39, 48],
  [-3, 48],
];
const MAP_EDGE = 8;

function segmentsOf(f: Field): SegmentTable {
  const pick = (end: 'a' | 'b', k: number): Float64Array => Float64Array.from(f.parts, (p) => p[end][k]);
  return {
    count: f.parts.length,
    conductor: Int32Array.from(f.parts, (p) => p.conductor),
    x1: pick('a', 0),
    y1: pick('a', 1),
    depth1: pick('a', 2),
    x2: pick('b', 0),
    y2: pick('b', 1),
    depth2: pick('b', 2),
    leakage: Float64Array.from(f.parts, (p, k) => f.current[k] / lengthOf(p)),
    along: Float64Array.from(
      f.parts,
      (p, k) =>
        (p.floating ? 0 : 0.2 * Math.exp(-Math.hypot(p.a[0] - 24, p.a[1] - 18) / 25)) * (k % 2 ? 1 : -1),
    ),
  };
}

/** Map per ampere injected. */
function unitMap(f: Field, spacing: number): CaseMap {
  const [x0, y0] = [-MAP_EDGE, -MAP_EDGE];
  const nx = Math.round((60 + 2 * MAP_EDGE) / spacing) + 1;
  const ny = Math.round((45 + 2 * MAP_EDGE) / spacing) + 1;
  const surface = new Float64Array(nx * ny);
  for (let j = 0; j < ny; j += 1)
    for (let i = 0; i < nx; i += 1) surface[j * nx + i] = f.at(x0 + i * spacing, y0 + j * spacing);
  const clampAt = (i: number, j: number): number =>
    surface[Math.min(ny - 1, Math.max(0, j)) * nx + Math.min(nx - 1, Math.max(0, i))];
  const step = surface.map((_, k) => {
    const [i, j] = [k % nx, Math.floor(k / nx)];
    return (
      Math.hypot(clampAt(i + 1, j) - clampAt(i - 1, j), clampAt(i, j + 1) - clampAt(i, j - 1)) / (2 * spacing)
    );
  });
  return {
    x0,
    y0,
    dx: spacing,
    dy: spacing,
    nx,
    ny,
    potential: surface,
    touch: surface.map((v) => f.resistance - v),
    step,
    error: 0.002 * f.resistance,
  };
}

function inside(polygon: Polygon, x: number, y: number): boolean {
  return polygon.reduce((odd, [xi, yi], i) => {
    const [xj, yj] = polygon[(i + polygon.length - 1) % polygon.length];
    return yi > y !== yj > y && x < ((xj - xi) * (y - yi)) / (yj - yi) + xi ? !odd : odd;
  }, false);
}

function worstOn(map: CaseMap, values: Float64Array, area: Polygon): { value: number; x: number; y: number } {
  let worst = { value: -1, x: 0, y: 0 };
  values.forEach((value, k) => {
    const [x, y] = [map.x0 + (k % map.nx) * map.dx, map.y0 + Math.floor(k / map.nx) * map.dy];
    if (value > worst.value && inside(area, x, y)) worst = { value, x, y };
  });
  return worst;
}

function scaledMap(map: CaseMap, by: number): CaseMap {
  const times = (v: Float64Array): Float64Array => v.map((x) => x * by);
  return {
    ...map,
    potential: times(map.potential),
    touch: times(map.touch),
    step: times(map.step),
    error: map.error * by,
  };
}

function figuresOf(f: Field, map: CaseMap, name: string, amperes: number, y: number): CaseFigures {
  const [from, to]: [Point, Point] = [
    [-MAP_EDGE, y],
    [60 + MAP_EDGE, y],
  ];
  const distance = Float64Array.from({ length: 305 }, (_, k) => k * 0.25);
  const surface = distance.map((d) => amperes * f.at(from[0] + d, y));
  const profile = {
    from,
    to,
    distance,
    potential: surface,
    touch: surface.map((v) => amperes * f.resistance - v),
  };
  return { name, map: scaledMap(map, amperes), profile };
}

/** An outcome from the options; the same options give the same outcome. */
export function fixtureOutcome(options: FixtureOptions = {}): Outcome {
  const {
    title = 'Aldermoor 33 kV intake',
    caseNames = NAMES,
    currents = [3180, 1650, 900],
    spacing = 1,
    uncertainty = 0.005,
  } = options;
  const fenceName = options.fenceName ?? 'fence';
  const conductors = fixtureConductors(fenceName);
  const f = field(conductors);
  const map = unitMap(f, spacing);
  const touch = worstOn(map, map.touch, TOUCH_AREA);
  const step = worstOn(map, map.step, STEP_AREA);
  const covering = 1 - (0.09 * (1 - 300 / 2500)) / (2 * 0.1 + 0.09);
  const cases = caseNames.map((name, k): CaseResult => {
    const faultCurrent = currents[k % currents.length];
    const amperes = faultCurrent * DIVISION * DECREMENT;
    const duration = DURATIONS[k % DURATIONS.length];
    const touchLimit = ((1000 + 1.5 * covering * 2500) * 0.157) / Math.sqrt(duration);
    const stepLimit = ((1000 + 6 * covering * 2500) * 0.157) / Math.sqrt(duration);
    const compare = (worst: number, limit: number, x: number, y: number): CaseResult['touch'] => ({
      worst_V: worst,
      uncertainty_V: worst * uncertainty,
      x_m: x,
      y_m: y,
      on_covering: true,
      limit_V: limit,
      within_limit: worst <= limit,
      margin_percent: 100 * (1 - worst / limit),
    });
    return {
      name,
      fault_current_A: faultCurrent,
      division_factor: DIVISION,
      decrement_factor: DECREMENT,
      duration_s: duration,
      frequency_hz: 50,
      x_over_r: 8,
      grid_current_A: amperes,
      inject: { x_m: 24, y_m: 18, depth_m: 0.6 },
      resistance_ohm: f.resistance,
      resistance_uncertainty_ohm: 0.002 * f.resistance,
      gpr_V: amperes * f.resistance,
      gpr_uncertainty_V: 0.002 * amperes * f.resistance,
      bare_touch_limit_V: 0.4 * touchLimit,
      bare_step_limit_V: 0.2 * stepLimit,
      covering_touch_limit_V: touchLimit,
      covering_step_limit_V: stepLimit,
      touch: compare(amperes * touch.value, touchLimit, touch.x, touch.y),
      step: {
        ...compare(amperes * step.value, stepLimit, step.x, step.y),
        from: { x_m: step.x - 0.5, y_m: step.y },
        to: { x_m: step.x + 0.5, y_m: step.y },
      },
    };
  });
  return {
    study: studyOf(title, cases),
    results: resultsOf({
      title,
      cases,
      f,
      conductors,
      fenceName,
      covering,
      touch: touch.value,
      step: step.value,
    }),
    plan: {
      conductors,
      joints: RODS.map(([x, y]) => [x, y, 0.6] as const),
      touchArea: [TOUCH_AREA],
      stepArea: [STEP_AREA],
      areasGiven: { touch: false, step: false },
    },
    segments: segmentsOf(f),
    cases: cases.map((c) => figuresOf(f, map, c.name, c.grid_current_A, touch.y)),
  };
}

function studyOf(title: string, cases: readonly CaseResult[]): Outcome['study'] {
  return {
    format: 'ohmstead-study',
    version: 1,
    title,
    soil: { layers: [{ resistivity_ohm_m: 300, thickness_m: 2 }, { resistivity_ohm_m: 100 }] },
    surfacing: { resistivity_ohm_m: 2500, thickness_m: 0.1 },
    metal_model: 'resistive',
    conductors: ['conductors.csv'],
    electrodes: [{ name: 'fence', role: 'floating' }],
    cases: cases.map((c) => ({
      name: c.name,
      fault_current_A: c.fault_current_A ?? undefined,
      division_factor: DIVISION,
      x_over_r: 8,
      frequency_hz: 50,
      duration_s: c.duration_s,
      inject: c.inject,
    })),
    limits: { basis: 'IEEE 80', body_mass_kg: 70 },
  };
}

interface ResultParts {
  readonly title: string;
  readonly cases: readonly CaseResult[];
  readonly f: Field;
  readonly conductors: readonly PlanConductor[];
  readonly fenceName: string;
  readonly covering: number;
  readonly touch: number;
  readonly step: number;
}

function resultsOf({ title, cases, f, conductors, fenceName, covering, touch, step }: ResultParts): Results {
  const r = f.resistance;
  const metal = conductors.filter((c) => c.role === 'energised');
  const length = (list: readonly PlanConductor[]): number =>
    list.reduce((sum, c) => sum + Math.hypot(c.x2 - c.x1, c.y2 - c.y1, c.depth2 - c.depth1), 0);
  const fence = conductors.filter((c) => c.role === 'floating');
  return {
    format: 'ohmstead-results',
    version: 1,
    program_version: '0.1.0',
    title,
    ground: null,
    equivalent_uniform: [],
    seasons: [],
    envelope: [],
    metal_model: 'resistive',
    electrode: {
      resistance_ohm: r,
      resistance_uncertainty_ohm: 0.002 * r,
      segment_count: f.parts.length,
      node_count: 68,
      conductor_count: metal.length - RODS.length,
      rod_count: RODS.length,
      conductor_length_m: length(metal),
    },
    electrodes: [
      {
        name: 'main',
        role: 'energised',
        piece_count: 1,
        potential_ratio: 1,
        potential_uncertainty_ratio: 0,
        leakage_ratio: 1,
        conductor_count: metal.length - RODS.length,
        rod_count: RODS.length,
        conductor_length_m: length(metal),
        touch_ratio: null,
        touch_x_m: null,
        touch_y_m: null,
        touch_uncertainty_ratio: null,
        touch_on_covering: null,
      },
      {
        name: fenceName,
        role: 'floating',
        piece_count: 1,
        potential_ratio: f.fence / r,
        potential_uncertainty_ratio: 0.001,
        leakage_ratio: 0,
        conductor_count: fence.length,
        rod_count: 0,
        conductor_length_m: length(fence),
        touch_ratio: -(f.fence - f.at(63.5, 21.5)) / r,
        touch_x_m: 63.5,
        touch_y_m: 21.5,
        touch_uncertainty_ratio: 0.004,
        touch_on_covering: true,
      },
    ],
    checks: {
      current_balance: 3.1e-13,
      residual: 8.4e-13,
      node_balance: 2.2e-13,
      solver_iterations: 21,
      image_error: 4.2e-7,
      image_count: 96,
    },
    soil: {
      layers: [
        { resistivity_ohm_m: 300, thickness_m: 2 },
        { resistivity_ohm_m: 100, thickness_m: null },
      ],
    },
    limits: {
      basis: 'IEEE 80',
      body_mass_kg: 70,
      soil_resistivity_ohm_m: 300,
      surfacing_resistivity_ohm_m: 2500,
      surfacing_thickness_m: 0.1,
      covering_factor: covering,
    },
    mesh: [
      {
        segment_count: 122,
        resistance_ohm: 1.006 * r,
        worst_touch_ratio: (0.96 * touch) / r,
        worst_step_ratio: (0.95 * step) / r,
      },
      {
        segment_count: f.parts.length,
        resistance_ohm: r,
        worst_touch_ratio: touch / r,
        worst_step_ratio: step / r,
      },
    ],
    cases,
    snaps: [{ id: 'R3', other_id: 'E1', x_m: 60, y_m: 0, depth_m: 0.6, distance_m: 0.012 }],
    assumptions: [
      {
        code: 'area-touch-default',
        message:
          'no touch area is given: the inside of the outer boundary of the energised electrode is assessed',
      },
      { code: 'fence-continuous', message: 'the fence is taken as one continuous piece of metal' },
    ],
    warnings: [
      {
        code: 'surfacing-assumed-wet',
        message:
          'the covering is taken at 2500 Ω·m; its resistivity when wet has to be confirmed by measurement',
      },
    ],
  };
}
