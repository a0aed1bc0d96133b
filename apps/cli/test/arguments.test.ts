// The command line is read by its specification; every fault in it is told at once.
import { faultLine, InputFaults } from '@ohmstead/study';
import { expect, test } from 'vitest';
import { readArguments } from '../src/arguments.ts';
import type { CommandSpec } from '../src/command.ts';

const spec: CommandSpec = {
  name: 'cut',
  operand: 'TREE',
  summary: '',
  options: [
    { name: 'dry', help: '' },
    { name: 'saw', value: 'FILE', help: '' },
    { name: 'depth', value: 'METRES', required: true, help: '' },
  ],
  details: [],
  example: 'ohmstead cut oak',
};

function faults(...words: readonly string[]): readonly string[] {
  try {
    readArguments(spec, words);
  } catch (error) {
    if (error instanceof InputFaults) return error.faults.map(faultLine);
    throw error;
  }
  return [];
}

test('operand, values and switches in any order', () => {
  for (const words of [
    ['oak', '--dry', '--saw', 's.txt', '--depth=2'],
    ['--depth', '2', '--saw=s.txt', '--dry', 'oak'],
  ]) {
    expect(readArguments(spec, words)).toEqual({
      operand: 'oak',
      values: new Map([
        ['saw', 's.txt'],
        ['depth', '2'],
      ]),
      switches: new Set(['dry']),
    });
  }
});

test('behind -- and =, words may begin with a dash', () => {
  expect(readArguments(spec, ['--depth=-2', '--', '-oak'])).toMatchObject({
    operand: '-oak',
    values: new Map([['depth', '-2']]),
  });
});

test('--help wins over faults', () => {
  expect(readArguments(spec, ['--no-such', '--help'])).toBe('help');
  expect(readArguments(spec, ['-h'])).toBe('help');
});

test.each([
  [
    ['oak', '--depth', '1', '--dpeth', '2'],
    'ohmstead cut: --dpeth: not an option of cut; did you mean --depth?',
  ],
  [['oak', '--depth', '1', '-j'], 'ohmstead cut: -j: not an option of cut'],
  [['oak', '--depth', '1', '--saw'], 'ohmstead cut: --saw: nothing given; expected FILE'],
  [['oak', '--depth', '1', '--saw='], 'ohmstead cut: --saw: nothing given; expected FILE'],
  [
    ['oak', '--depth', '1', '--saw', '--dry'],
    'ohmstead cut: --saw: nothing given before --dry; expected FILE',
  ],
  [['oak', '--depth', '1', '--dry=yes'], 'ohmstead cut: --dry: "yes" given; takes no value'],
  [['oak', '--depth', '1', '--depth', '2'], 'ohmstead cut: --depth: given twice; expected once'],
  [['oak'], 'ohmstead cut: --depth: missing; expected --depth METRES'],
  [['--depth', '1'], 'ohmstead cut: TREE: missing; try: ohmstead cut oak'],
  [['', '--depth', '1'], 'ohmstead cut: TREE: missing; try: ohmstead cut oak'],
  [['oak', 'elm', '--depth', '1'], 'ohmstead cut: TREE: "elm" is one too many'],
])('%j', (words, line) => {
  expect(faults(...words)).toEqual([line]);
});

test('all faults together', () => {
  expect(faults('--dri', '--saw')).toHaveLength(4);
});
