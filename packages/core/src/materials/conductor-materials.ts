// Conductor materials by name: resistivity, its growth with temperature, heat capacity and fusing point.

export interface ConductorMaterial {
  /** key in tables and files */
  readonly name: string;
  /** for people */
  readonly label: string;
  /** conductivity, % of annealed copper */
  readonly conductivityPercent: number;
  /** resistivity at 20 °C, Ω·m; a clad conductor counts as one metal of its whole section */
  readonly resistivity20: number;
  /** growth of resistivity referred to 20 °C, 1/K */
  readonly temperatureCoefficient20: number;
  /** K0 = 1/α0, the reciprocal of the coefficient referred to 0 °C, °C */
  readonly reciprocalCoefficient0: number;
  /** °C */
  readonly fusingTemperature: number;
  /** heat to warm a volume by one kelvin, J/(m³·K) */
  readonly heatCapacity: number;
}

const MICRO_OHM_CM_PER_OHM_M = 1e8;
const CM3_PER_M3 = 1e6;

type Row = readonly [
  name: string,
  label: string,
  conductivityPercent: number,
  temperatureCoefficient20: number,
  reciprocalCoefficient0: number,
  fusingTemperature: number,
  microOhmCm: number,
  joulePerCm3K: number,
];

// IEEE Std 80-2000, table 1, as agreed by independent public copies; the names are ours.
const rows: readonly Row[] = [
  ['copper-annealed', 'copper, annealed soft-drawn', 100, 0.00393, 234, 1083, 1.72, 3.42],
  ['copper-hard-drawn', 'copper, commercial hard-drawn', 97, 0.00381, 242, 1084, 1.78, 3.42],
  ['copper-clad-steel-40', 'copper-clad steel wire, 40 %', 40, 0.00378, 245, 1084, 4.4, 3.85],
  ['copper-clad-steel-30', 'copper-clad steel wire, 30 %', 30, 0.00378, 245, 1084, 5.86, 3.85],
  ['copper-clad-steel-rod-20', 'copper-clad steel rod, 20 %', 20, 0.00378, 245, 1084, 8.62, 3.85],
  ['aluminium-ec', 'aluminium, electrical grade', 61, 0.00403, 228, 657, 2.86, 2.56],
  ['aluminium-5005', 'aluminium alloy 5005', 53.5, 0.00353, 263, 652, 3.22, 2.6],
  ['aluminium-6201', 'aluminium alloy 6201', 52.5, 0.00347, 268, 654, 3.28, 2.6],
  ['aluminium-clad-steel', 'aluminium-clad steel wire', 20.3, 0.0036, 258, 657, 8.48, 3.58],
  ['steel-1020', 'steel 1020', 10.8, 0.0016, 605, 1510, 15.9, 3.28],
  ['stainless-clad-steel-rod', 'stainless-clad steel rod', 9.8, 0.0016, 605, 1400, 17.5, 4.44],
  ['zinc-coated-steel-rod', 'zinc-coated steel rod', 8.6, 0.0032, 293, 419, 20.1, 3.93],
  ['stainless-steel-304', 'stainless steel 304', 2.4, 0.0013, 749, 1400, 72, 4.03],
];

/** Every conductor material by its name, in the order of IEEE Std 80-2000, table 1. */
export const conductorMaterials: ReadonlyMap<string, ConductorMaterial> = new Map(
  rows.map(([name, label, conductivityPercent, alpha, k0, fusing, microOhmCm, joulePerCm3K]) => [
    name,
    {
      name,
      label,
      conductivityPercent,
      resistivity20: microOhmCm / MICRO_OHM_CM_PER_OHM_M,
      temperatureCoefficient20: alpha,
      reciprocalCoefficient0: k0,
      fusingTemperature: fusing,
      heatCapacity: joulePerCm3K * CM3_PER_M3,
    },
  ]),
);
