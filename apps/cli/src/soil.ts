// `ohmstead soil`: layers fitted to the readings of a four-pin survey, as a table or as JSON.
import { jsonText } from '@ohmstead/pack';
import { InputFaults, type Note, type SoilFit } from '@ohmstead/study';
import type { Arguments, Command } from './command.ts';
import type { Engine } from './engine.ts';
import { DONE, type ExitStatus } from './exit-status.ts';
import { fileSource } from './file-source.ts';
import type { Io } from './io.ts';
import { printable } from './printable.ts';
import { soilTable } from './soil-table.ts';

/** As many as a study may have fitted. */
const MOST_LAYERS = 5;

export const soil: Command = {
  name: 'soil',
  operand: 'SURVEY.csv',
  summary:
    'fits a layered soil to the readings of a four-pin survey, and tells which other soils fit as well',
  options: [
    {
      name: 'layers',
      value: 'N',
      help: 'number of layers, 1 to 5, or auto (as without it): the number that the readings call for',
    },
    { name: 'json', help: 'the fit as JSON instead of a table' },
  ],
  details: [
    'SURVEY.csv has one reading a row and a header row. Where the pins stood: spacing_m (Wenner), or ab_half_m and mn_half_m (Schlumberger), or c1_x_m, c2_x_m, p1_x_m and p2_x_m (any four pins on a line; current pins, then potential pins). What was read: apparent_resistivity_ohm_m or resistance_ohm. Optional: pin_depth_m, traverse. A table may mix arrays: cells of the others stay blank. The unit is read from the name of the column (spacing_ft).',
    'The table gives each layer as fitted best and the range of 90 % of the soils that the readings allow, then every reading with its misfit.',
  ],
  example: 'ohmstead soil test-data/brackwater/survey.csv --layers auto',
  run: runSoil,
};

async function runSoil(given: Arguments, io: Io, engine: Engine): Promise<ExitStatus> {
  const layers = layerCount(given.values.get('layers'));
  const survey = engine.loadSurvey(fileSource(given.operand), given.operand);
  for (const { code, message } of survey.notes) io.err(`note: ${printable(message)} (${code})\n`);
  const { fit } = engine.fitSurvey(survey, layers);
  if (!given.switches.has('json')) {
    io.out(soilTable(fit, engine.version));
    return DONE;
  }
  io.out(jsonText(soilJson(fit, survey.notes, engine.version)));
  for (const { code, message } of fit.doubts) io.err(`warning: ${printable(message)} (${code})\n`);
  return DONE;
}

function layerCount(text: string | undefined): number | 'auto' {
  if (text === undefined || text === 'auto') return 'auto';
  const count = /^\d$/.test(text) ? Number(text) : 0;
  if (count >= 1 && count <= MOST_LAYERS) return count;
  const expected = `expected a whole number from 1 to ${MOST_LAYERS}, or auto`;
  const message = `${JSON.stringify(text)} is not accepted; ${expected}`;
  throw new InputFaults([{ file: 'ohmstead soil', place: '--layers', code: 'usage', message }]);
}

/** Names of the contract first, the layers as a study takes them; then the whole fit with each layer's spread. */
function soilJson(fit: SoilFit, notes: readonly Note[], version: string): object {
  const { layers: spreads, rms_percent, outcome, ...rest } = fit;
  return {
    format: 'ohmstead-soil',
    version: 1,
    program_version: version,
    layers: spreads.map(({ resistivity_ohm_m, thickness_m }) => ({
      resistivity_ohm_m: resistivity_ohm_m.best,
      ...(thickness_m === null ? {} : { thickness_m: thickness_m.best }),
    })),
    rms_percent,
    outcome,
    layer_spreads: spreads,
    ...rest,
    notes,
  };
}
