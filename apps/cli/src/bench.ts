// Times the engine beside its rivals, as ratios in one run, with the accuracy of each: `npm run bench`.
import { runChild } from './bench-child.ts';
import { claimRows } from './bench-claims.ts';
import { mergedFindings } from './bench-findings.ts';
import { gateLine, passes } from './bench-gates.ts';
import { largePart } from './bench-large.ts';
import { LARGE_OPTION } from './bench-large-child.ts';
import { machineLine } from './bench-machine.ts';
import { footnotes, numpyLine } from './bench-notes.ts';
import { type Numpy, probeNumpy } from './bench-numpy.ts';
import { allParts, smallestParts } from './bench-plan.ts';
import type { Part, Surroundings } from './bench-stage.ts';
import { table } from './bench-table.ts';

/** `--smallest`: seconds, with gates; `--full`: minutes, with the slowest rivals; otherwise what fits between. */
async function main(args: readonly string[]): Promise<void> {
  if (args[0] === LARGE_OPTION) {
    const soil = args[1] === 'four layers' ? 'four layers' : 'two layers';
    process.stdout.write(JSON.stringify(await largePart(soil, Number(args[2]))));
    return;
  }
  const smallest = args.includes('--smallest');
  const around: Surroundings = {
    numpy: smallest ? NOT_ASKED : await probeNumpy(runChild),
    spawner: runChild,
    full: args.includes('--full'),
    told: (text) => void process.stderr.write(`${text}\n`),
  };
  print([`${machineLine()}. ${await numpyLine(around)}`]);
  const parts: Part[] = [];
  for (const part of smallest ? smallestParts(around) : allParts(around)) {
    const found = await part();
    print(found.lines);
    parts.push(found);
  }
  if (smallest) judgeGates(parts);
  else {
    const findings = mergedFindings(parts.map((part) => part.findings));
    print(table(['it must show', 'measured', 'must', 'stretch'], claimRows(findings)));
    print(footnotes(around));
  }
}

const NOT_ASKED: Numpy = { kind: 'absent', reason: 'the smallest run compares in one process only' };

function print(lines: readonly string[]): void {
  process.stdout.write(`${lines.join('\n')}\n\n`);
}

function judgeGates(parts: readonly Part[]): void {
  const gates = parts.flatMap((part) => part.gates ?? []);
  print(gates.map(gateLine));
  if (!gates.every(passes)) process.exitCode = 1;
}

await main(process.argv.slice(2));
