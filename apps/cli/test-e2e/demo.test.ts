// The built program on the demo: statuses, streams, the pack and its verification.
import { mkdtempSync, readFileSync, rmSync, writeFileSync } from 'node:fs';
import { tmpdir } from 'node:os';
import { join } from 'node:path';
import { readPack } from '@ohmstead/pack';
import { afterAll, beforeAll, describe, expect, test } from 'vitest';
import { DEMO, ohmstead, type Run, shell } from './program.ts';

let folder: string;
let first: Run;
beforeAll(() => {
  folder = mkdtempSync(join(tmpdir(), 'ohmstead-'));
  first = ohmstead('solve', DEMO, '--pack', join(folder, 'a.zip'));
});
afterAll(() => rmSync(folder, { recursive: true }));

describe('solve', () => {
  test('the answer stands first, within the width of a terminal and without colour', () => {
    expect(first.status).toBe(0);
    const lines = first.out.split('\n');
    expect(lines[0]).toBe('Aldermoor 33 kV intake');
    expect(lines[1]).toMatch(/^One of three cases exceeds a limit/);
    expect(Math.max(...lines.map((line) => [...line].length))).toBeLessThanOrEqual(100);
    expect(first.out).not.toContain('\u001b');
    expect(first.out).toMatch(/EXCEEDS/);
    expect(first.out).toMatch(/local codes and\s+licensed practice/);
  });

  test('--json is JSON alone, twice the same, and what the pack holds', async () => {
    const { status, out } = ohmstead('solve', DEMO, '--json');
    expect(status).toBe(0);
    expect(JSON.parse(out)).toMatchObject({
      format: 'ohmstead-results',
      version: 1,
      title: 'Aldermoor 33 kV intake',
    });
    const { entries } = await readPack(readFileSync(join(folder, 'a.zip')));
    expect(new TextDecoder().decode(entries.get('results.json'))).toBe(out);
  });

  test('the table and the sheet give the same answer', async () => {
    const { entries } = await readPack(readFileSync(join(folder, 'a.zip')));
    const sheet = new TextDecoder()
      .decode(entries.get('index.html'))
      .replace(/<[^>]+>/g, ' ')
      .replace(/\s+/g, ' ');
    const [answer] = first.out.split('\n')[1].split('.');
    expect(answer).toMatch(/limit/);
    expect(sheet.toLowerCase()).toContain(answer.toLowerCase());
  });

  test('--strict ends with 3, for one case exceeds a limit', () => {
    expect(ohmstead('solve', DEMO, '--strict', '--json').status).toBe(3);
  });

  test('a reader that closes the pipe early is no fault', () => {
    const { out, err } = shell('node "$PROGRAM" solve "$DEMO" --json | true; echo "$PIPESTATUS"');
    expect(out).toBe('0\n');
    expect(err).not.toMatch(/EPIPE|Error|fault/);
  });
});

test('output that cannot be written is told and is not status 0', () => {
  const { out, err } = shell('node "$PROGRAM" --version > /dev/full; echo "$?"');
  expect([out, err]).toEqual([
    '1\n',
    'ohmstead: standard output cannot be written: no space left on the disk\n',
  ]);
});

describe('review pack', () => {
  test('the same study leaves the same bytes', () => {
    ohmstead('solve', `${DEMO}/study.json`, '--json', '--pack', join(folder, 'b.zip'));
    expect(readFileSync(join(folder, 'b.zip')).equals(readFileSync(join(folder, 'a.zip')))).toBe(true);
  });

  test('verifies without a difference', () => {
    const { status, out } = ohmstead('verify', join(folder, 'a.zip'));
    expect(out).toMatch(/\nno difference\n$/);
    expect(status).toBe(0);
  });

  test('a flipped bit in it is found, as a fault of the zip or a difference', () => {
    const bytes = readFileSync(join(folder, 'a.zip'));
    bytes[Math.floor(bytes.length / 3)] ^= 1;
    writeFileSync(join(folder, 'flipped.zip'), bytes);
    const { status, err } = ohmstead('verify', join(folder, 'flipped.zip'));
    expect([2, 3]).toContain(status);
    expect(err).not.toContain('fault in the program');
  });
});

test('field agrees with solve at the worst place', () => {
  const { cases } = JSON.parse(ohmstead('solve', DEMO, '--json').out);
  const { x_m: x, y_m: y, worst_V: worst } = cases[1].touch;
  writeFileSync(join(folder, 'points.csv'), `x_m,y_m\n${x},${y}\n`);
  const { status, out } = ohmstead(
    'field',
    DEMO,
    '--points',
    join(folder, 'points.csv'),
    '--case',
    cases[1].name,
  );
  expect(status).toBe(0);
  const [header, row] = out.split('\n');
  expect(header).toBe('x_m,y_m,depth_m,potential_V,touch_V');
  const touch = Number(row.split(',')[4]);
  // one is taken from the same solution as the other; both are sums of the same terms
  expect(Math.abs(Math.abs(touch) - worst)).toBeLessThan(1e-6 * worst);
});
