// Floating electrodes that touch what they should not.
import { expect, test } from 'vitest';
import { floatingJoined } from '../../src/geometry/floating-joined.ts';
import { joinConductors } from '../../src/geometry/joints.ts';
import { conductorTable, type Row, wire } from './conductor-rows.ts';

function told(rows: readonly Row[], floating: readonly string[]): string[] {
  const table = conductorTable(rows);
  return floatingJoined(table, joinConductors(table), new Set(floating)).map(
    ({ code, conductor, other, message }) => `${code} ${conductor} ${other} ${message}`,
  );
}

const grid = [wire(0, 0, 10, 0), wire(0, 0, 0, 10)];
const fence = { ...wire(5, -2, 5, 2), electrode: 'fence' };

test('a fence across the grid is told with the conductor that it touches and the place', () => {
  expect(told([...grid, fence], ['fence'])).toEqual([
    'floating-joined 2 0 electrode fence is stated to be floating but touches c1 of electrode main at (5.00, 0.00) m, depth 0.50 m',
  ]);
});

test('every conductor of the fence that touches the grid is told once', () => {
  const across = { ...wire(-2, 5, 20, 5), electrode: 'fence' };
  const away = { ...wire(20, 5, 20, 20), electrode: 'fence' };
  expect(told([fence, across, away, ...grid], ['fence']).map((line) => line.slice(0, 19))).toEqual([
    'floating-joined 0 3',
    'floating-joined 1 4',
  ]);
});

test('a fence whose end touches the grid is told, in the first row too', () => {
  const end = { ...wire(5, 0, 5, -2), electrode: 'fence' };
  expect(told([end, ...grid], ['fence']).map((line) => line.slice(0, 19))).toEqual(['floating-joined 0 1']);
});

test('a fence clear of the grid, and electrodes that may be joined, are not told', () => {
  expect(told([...grid, { ...wire(5, 2, 5, 4), electrode: 'fence' }], ['fence'])).toEqual([]);
  expect(told([...grid, fence], [])).toEqual([]);
});
