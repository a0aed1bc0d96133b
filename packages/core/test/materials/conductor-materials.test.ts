// Conductor materials against the sizing factors printed for them.
import { describe, expect, test } from 'vitest';
import { type ConductorMaterial, conductorMaterials } from '../../src/materials/conductor-materials.ts';

// IEEE Std 80-2000, table 2: Kf printed for the fusing temperature and 40 °C ambient (from memory).
const printedKf: readonly (readonly [string, number])[] = [
  ['copper-annealed', 7.0],
  ['copper-hard-drawn', 7.06],
  ['copper-clad-steel-40', 10.45],
  ['copper-clad-steel-30', 12.06],
  ['copper-clad-steel-rod-20', 14.64],
  ['aluminium-ec', 12.12],
  ['aluminium-5005', 12.41],
  ['aluminium-6201', 12.47],
  ['aluminium-clad-steel', 17.2],
  ['steel-1020', 15.95],
  ['stainless-clad-steel-rod', 14.72],
  ['zinc-coated-steel-rod', 28.96],
  ['stainless-steel-304', 30.05],
];

/** Kf = 1.97352·[(TCAP·1e-4/(αr·ρr))·ln((K0 + Tm)/(K0 + 40))]^(−1/2), IEEE Std 80-2000, 11.3 (from memory). */
function sizingFactor(material: ConductorMaterial): number {
  const joulePerCm3K = material.heatCapacity / 1e6;
  const microOhmCm = material.resistivity20 * 1e8;
  const { reciprocalCoefficient0: k0, temperatureCoefficient20: alpha, fusingTemperature } = material;
  const heating = (joulePerCm3K * 1e-4) / (alpha * microOhmCm);
  return 1.97352 / Math.sqrt(heating * Math.log((k0 + fusingTemperature) / (k0 + 40)));
}

function material(name: string): ConductorMaterial {
  const found = conductorMaterials.get(name);
  if (found === undefined) throw new Error(`no material ${name}`);
  return found;
}

describe('conductor materials', () => {
  test.each(printedKf)('%s gives the printed sizing factor %f', (name, printed) => {
    expect(Math.abs(sizingFactor(material(name)) - printed)).toBeLessThanOrEqual(0.01);
  });

  test('the table holds the materials that have a printed factor and no other', () => {
    expect([...conductorMaterials.keys()]).toEqual(printedKf.map(([name]) => name));
  });

  test('K0 is the coefficient referred to 0 °C, rounded: K0 = 1/αr − 20', () => {
    for (const { temperatureCoefficient20, reciprocalCoefficient0 } of conductorMaterials.values()) {
      expect(Math.abs(1 / temperatureCoefficient20 - 20 - reciprocalCoefficient0)).toBeLessThanOrEqual(0.51);
    }
  });

  // Conductivity is told against annealed copper, 1.7241 µΩ·cm: IEC 60028:1925 (from memory).
  // The conductivity of clad metal is a nominal figure: 40 % wire is 39.2 % by its resistivity.
  test('resistivity and conductivity tell the same within 2.5 %', () => {
    for (const { name, resistivity20, conductivityPercent } of conductorMaterials.values()) {
      const fromConductivity = 1.7241e-8 / (conductivityPercent / 100);
      expect(Math.abs(resistivity20 / fromConductivity - 1), name).toBeLessThan(0.025);
    }
  });
});
