// Volts on contour lines: on straight stretches, upright, apart from each other and from notes.
import type { Point } from '@ohmstead/study';
import { describe, expect, it } from 'vitest';
import { contains, overlap } from '../../src/geometry/box.ts';
import { type LabelRoom, labelIsolines } from '../../src/geometry/isoline-labels.ts';

const ROOM: LabelRoom = {
  bounds: { left: 0, top: 0, right: 600, bottom: 400 },
  avoid: [],
  height: 11,
  lines: () => 0,
  allowed: () => true,
};

const level = (lines: readonly (readonly Point[])[], width = 40) => ({ text: '500 V', width, lines });
const across: readonly Point[] = [
  [20, 200],
  [580, 200],
];

describe('labels of contour lines', () => {
  it('stand on the line, inside the drawing, and read from the left', () => {
    const slanting: readonly Point[] = [
      [580, 300],
      [20, 260],
    ];
    const labels = labelIsolines([level([across]), level([slanting])], ROOM);
    expect(labels.length).toBeGreaterThan(1);
    for (const { turn, box } of labels) {
      expect(Math.abs(turn)).toBeLessThanOrEqual(90);
      expect(contains(ROOM.bounds, box)).toBe(true);
    }
    expect(labels.some(({ y, turn }) => y === 200 && turn === 0)).toBe(true);
    expect(labels.some(({ y, turn }) => y > 250 && turn > 0 && turn < 10)).toBe(true);
  });

  it('never overlap each other or an obstacle', () => {
    const lines = Array.from({ length: 12 }, (_, k): readonly Point[] => [
      [10, 150 + 6 * k],
      [590, 150 + 6 * k],
    ]);
    const avoid = [{ left: 200, top: 100, right: 400, bottom: 300 }];
    const labels = labelIsolines(
      lines.map((line) => level([line])),
      { ...ROOM, avoid },
    );
    expect(labels.length).toBeGreaterThan(4);
    labels.forEach((a, i) => {
      expect(overlap(a.box, avoid[0])).toBe(0);
      for (const b of labels.slice(i + 1)) expect(overlap(a.box, b.box)).toBe(0);
    });
  });

  it('leave short and bent lines bare', () => {
    const circle = Array.from(
      { length: 40 },
      (_, k): Point => [300 + 14 * Math.cos(k / 6), 200 + 14 * Math.sin(k / 6)],
    );
    expect(labelIsolines([level([circle])], ROOM)).toHaveLength(0);
    expect(
      labelIsolines(
        [
          level([
            [
              [0, 50],
              [60, 50],
            ],
          ]),
        ],
        ROOM,
      ),
    ).toHaveLength(0);
  });

  it('cross metal only where the level would stay bare', () => {
    const left = (box: { right: number }): number => (box.right < 300 ? 1 : 0);
    const beside = labelIsolines([level([across])], { ...ROOM, lines: left });
    expect(beside.length).toBeGreaterThan(0);
    for (const { box } of beside) expect(box.right).toBeGreaterThanOrEqual(300);
    expect(labelIsolines([level([across])], { ...ROOM, lines: () => 1 }).length).toBeGreaterThan(0);
  });

  it('stay on allowed ground', () => {
    for (const { x } of labelIsolines([level([across])], { ...ROOM, allowed: ({ x }) => x > 400 })) {
      expect(x).toBeGreaterThan(400);
    }
  });
});
