// Reads the words behind a command's name: its operand and options, or every fault in them.
import { parseArgs } from 'node:util';
import { type Fault, InputFaults } from '@ohmstead/study';
import type { Arguments, CommandSpec } from './command.ts';
import { suggestion } from './suggestion.ts';

type Token = NonNullable<ReturnType<typeof parseArgs>['tokens']>[number];
type OptionToken = Extract<Token, { kind: 'option' }>;

/**
 * Reads a command line by its specification.
 * @param spec of the command
 * @param words behind the command's name
 * @returns what was given, or `help` where `--help` stands anywhere
 * @throws InputFaults with every fault of the command line
 */
export function readArguments(spec: CommandSpec, words: readonly string[]): Arguments | 'help' {
  const values = spec.options.filter(({ value }) => value !== undefined);
  const { tokens } = parseArgs({
    args: [...words],
    options: Object.fromEntries([
      ['help', { type: 'boolean', short: 'h' }],
      ...spec.options.map(({ name, value }) => [name, { type: value === undefined ? 'boolean' : 'string' }]),
    ]),
    strict: false,
    allowPositionals: true,
    tokens: true,
  });
  const given = tokens.filter((token): token is OptionToken => token.kind === 'option');
  if (given.some(({ name }) => name === 'help')) return 'help';
  const operands = tokens.flatMap((token) => (token.kind === 'positional' ? [token.value] : []));
  // The word behind an unknown option may be its value: it is not called surplus as well.
  const known = given.every(({ name }) => spec.options.some((option) => option.name === name));
  const faults = [
    ...optionFaults(spec, given),
    ...requiredFaults(spec, given),
    ...operandFaults(spec, known ? operands : operands.slice(0, 1)),
  ];
  if (faults.length > 0) throw new InputFaults(faults);
  return {
    operand: operands[0],
    values: new Map(
      values.flatMap(({ name }) => given.filter((g) => g.name === name).map((g) => [name, g.value ?? ''])),
    ),
    switches: new Set(given.filter(({ value }) => value === undefined).map(({ name }) => name)),
  };
}

function optionFaults(spec: CommandSpec, given: readonly OptionToken[]): readonly Fault[] {
  const seen = new Set<string>();
  return given.flatMap((token) => {
    const complaint = seen.has(token.name) ? 'given twice; expected once' : optionComplaint(spec, token);
    seen.add(token.name);
    return complaint === undefined ? [] : [usageFault(spec, complaint, token.rawName)];
  });
}

function optionComplaint(spec: CommandSpec, token: OptionToken): string | undefined {
  const option = spec.options.find(({ name }) => name === token.name);
  if (option === undefined) {
    const near = suggestion(token.name, [...spec.options.map(({ name }) => name), 'help']);
    return `not an option of ${spec.name}${near === undefined ? '' : `; did you mean --${near}?`}`;
  }
  if (option.value === undefined) {
    return token.value === undefined ? undefined : `${JSON.stringify(token.value)} given; takes no value`;
  }
  if (token.value === undefined || token.value === '') return `nothing given; expected ${option.value}`;
  if (!token.inlineValue && token.value.startsWith('-')) {
    return `nothing given before ${token.value}; expected ${option.value}`;
  }
  return undefined;
}

function requiredFaults(spec: CommandSpec, given: readonly OptionToken[]): readonly Fault[] {
  const missing = spec.options.filter(
    ({ name, required }) => required === true && !given.some((token) => token.name === name),
  );
  return missing.map(({ name, value }) =>
    usageFault(spec, `missing; expected --${name} ${value}`, `--${name}`),
  );
}

function operandFaults(spec: CommandSpec, operands: readonly string[]): readonly Fault[] {
  if (operands.length === 0 || operands[0] === '') {
    return [usageFault(spec, `missing; try: ${spec.example}`, spec.operand)];
  }
  return operands
    .slice(1)
    .map((word) => usageFault(spec, `${JSON.stringify(word)} is one too many`, spec.operand));
}

function usageFault(spec: CommandSpec, message: string, place: string): Fault {
  return { file: `ohmstead ${spec.name}`, place, code: 'usage', message };
}
