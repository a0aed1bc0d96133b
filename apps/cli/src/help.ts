// The help: an overview, one page a command, and what a study is.

import { wrapped } from './columns.ts';
import type { CommandSpec, OptionSpec } from './command.ts';
import { whatAStudyIs } from './minimal-study.ts';

/** Characters of a line. */
const WIDTH = 100;
/** Column at which explanations begin. */
const INDENT = 22;

const EXIT_STATUS =
  paragraph(`Exit status: 0 done, 1 fault in the program, 2 fault in the input, 3 with --strict
a limit is exceeded or verify found a difference. Results go to standard output; all else goes to standard error.`);

const HELP_OPTION: OptionSpec = { name: 'help', help: 'this page' };

/** What the program does, its commands, and where to begin. */
export function overview(commands: readonly CommandSpec[]): string {
  const named = commands.map(({ name, operand, summary }) => row(`${name} ${operand}`, summary));
  return `${paragraph(`ohmstead analyses grounding (earthing) grids and electrodes: from conductors, soil and fault
currents to resistance, ground potential rise, and touch and step voltages against their limits.`)}

Usage: ohmstead COMMAND ...

${named.join('')}${row('help COMMAND', 'explains a command, with an example')}${row('help study', 'explains what a study is, with a small one to start from')}
Begin with the demo:
  ${commands[0].example}
then point the same command at a study of your own.

${EXIT_STATUS}

${paragraph(`Results are computed from the inputs given. Whether an installation is acceptable is for local codes
and licensed practice to decide.`)}
`;
}

/** Page of one command. */
export function commandHelp(spec: CommandSpec): string {
  const words = spec.options.map((option) =>
    option.required === true ? label(option) : `[${label(option)}]`,
  );
  const options = [...spec.options, HELP_OPTION].map((option) => row(label(option), option.help));
  return `Usage: ohmstead ${[spec.name, spec.operand, ...words].join(' ')}

${capital(spec.summary)}.

${spec.details.map(paragraph).join('\n\n')}

${options.join('')}
Example:
  ${spec.example}

${EXIT_STATUS}
`;
}

/** Page about studies. */
export function studyHelp(): string {
  return `${whatAStudyIs('conductors.csv')}
conductors.csv has one straight conductor a row and a header row, for instance:

id,x1_m,y1_m,depth1_m,x2_m,y2_m,depth2_m,diameter_mm
north,0,10,0.5,20,10,0.5,10
rod,0,10,0.5,0,10,3.5,16

${paragraph(`The unit is read from the column's name (x1_ft, diameter_in). Depths are positive downward from the
soil surface. Metal that touches is joined. Optional columns: material, electrode, insulated, resistance_ohm_per_m.`)}

${paragraph(`Instead of layers the soil may name a table of field readings, to which layers are fitted (its
columns: ohmstead help soil). Other states of the soil are solved too where the study names them; the worst of all
governs.`)}

  "soil": { "survey": "survey.csv", "layer_count": "auto" },
  "seasons": [ { "name": "frozen", "top": { "depth_m": 0.8, "resistivity_ohm_m": 1000 } },
               { "name": "wet", "below": { "depth_m": 1.5, "resistivity_ohm_m": 40 } } ]
`;
}

function label({ name, value }: OptionSpec): string {
  return value === undefined ? `--${name}` : `--${name} ${value}`;
}

function paragraph(text: string): string {
  return wrapped(text, WIDTH).join('\n');
}

function row(left: string, right: string): string {
  const lines = wrapped(right, WIDTH - INDENT);
  return lines.map((line, index) => `${(index === 0 ? `  ${left}` : '').padEnd(INDENT)}${line}\n`).join('');
}

function capital(text: string): string {
  return text.charAt(0).toUpperCase() + text.slice(1);
}
