// Prints the table of agreement with published and independent values: `npm run agreement`.
import { type LoadedStudy, loadStudy, solveStudy, sourceFromMap } from '@ohmstead/study';
import { type AgreementCase, agreementCases } from './agreement-cases.ts';

function studyOf({ name, bars, layers, touch }: AgreementCase): LoadedStudy {
  const header = 'x1_m,y1_m,depth1_m,x2_m,y2_m,depth2_m,diameter_mm';
  const rows = bars.map(([x1, y1, z1, x2, y2, z2, radius]) =>
    [x1, y1, z1, x2, y2, z2, 2000 * radius].join(','),
  );
  const square = touch && [[0, 0], [touch.mesh, 0], [touch.mesh, touch.mesh], [0, touch.mesh]]; // biome-ignore format: corners
  const study = {
    format: 'ohmstead-study',
    version: 1,
    title: name,
    soil: { layers: layers.map(([resistivity_ohm_m, thickness_m]) => ({ resistivity_ohm_m, thickness_m })) },
    metal_model: 'equipotential',
    conductors: ['conductors.csv'],
    cases: [{ name: 'one ampere', grid_current_A: 1, duration_s: 0.5 }],
    limits: { basis: 'IEEE 80', body_mass_kg: 70 },
    areas: square && { touch: [square] },
  };
  const encoder = new TextEncoder();
  return loadStudy(
    sourceFromMap(
      new Map([
        ['study.json', encoder.encode(JSON.stringify(study))],
        ['conductors.csv', encoder.encode([header, ...rows].join('\n'))],
      ]),
    ),
  );
}

const percent = (value: number, reference: number): string => {
  const off = 100 * (value / reference - 1);
  return `${off < 0 ? '−' : '+'}${Math.abs(off).toFixed(2)} %`;
};

async function row(one: AgreementCase): Promise<string> {
  const { electrode, cases } = (await solveStudy(studyOf(one))).results;
  const { resistance_ohm: r, resistance_uncertainty_ohm: u } = electrode;
  const { touch, gpr_V } = cases[0]!;
  const ratio = (100 * touch.worst_V) / gpr_V;
  const spread = (100 * touch.uncertainty_V) / gpr_V;
  const touchCell =
    one.touch === undefined
      ? '–'
      : `${one.touch.percent} / ${ratio.toFixed(2)} ± ${spread.toFixed(2)} (${percent(ratio, one.touch.percent)})`;
  const ours = `${one.resistance} / ${r.toPrecision(5)} ± ${u.toPrecision(1)} (${percent(r, one.resistance)})`;
  return `| ${one.name} | ${one.source} | ${ours} | ${touchCell} |`;
}

process.stdout.write(
  '| electrode | source | R, Ω: there / here | worst touch, % of the rise: there / here |\n|---|---|---|---|\n',
);
for (const one of agreementCases) process.stdout.write(`${await row(one)}\n`);
