// How conductors join: closed cases whose nodes can be counted by hand.
import { describe, expect, test } from 'vitest';
import { type Joints, joinConductors } from '../../src/geometry/joints.ts';
import { conductorTable, type Row, rod, wire } from './conductor-rows.ts';

function join(...rows: Row[]): Joints {
  return joinConductors(conductorTable(rows));
}

function counts(joints: Joints): readonly [nodes: number, pieces: number, components: number] {
  return [joints.nodeCount, joints.pieceCount, joints.componentCount];
}

function nodes(joints: Joints): (readonly number[])[] {
  return Array.from({ length: joints.nodeCount }, (_, i) => [
    joints.nodeX[i]!,
    joints.nodeY[i]!,
    joints.nodeDepth[i]!,
  ]);
}

describe('metal that touches is one node', () => {
  test('a crossing cuts both conductors', () => {
    const joints = join(wire(0, 2, 10, 2), wire(4, 0, 4, 8));
    expect(counts(joints)).toEqual([5, 4, 1]);
    expect(nodes(joints)).toEqual([
      [0, 2, 0.5],
      [4, 2, 0.5],
      [10, 2, 0.5],
      [4, 0, 0.5],
      [4, 8, 0.5],
    ]);
    expect(Array.from(joints.pieceConductor)).toEqual([0, 0, 1, 1]);
    expect(Array.from(joints.pieceStart)).toEqual([0, 0.4, 0, 0.25]);
    expect(Array.from(joints.pieceEnd)).toEqual([0.4, 1, 0.25, 1]);
    expect(Array.from(joints.pieceNode1)).toEqual([0, 1, 3, 1]);
    expect(Array.from(joints.pieceNode2)).toEqual([1, 2, 1, 4]);
    expect(Array.from(joints.nodeDegree)).toEqual([1, 4, 1, 1, 1]);
    expect(joints.snaps).toEqual([]);
    expect(joints.faults).toEqual([]);
  });

  test('an end on the middle of another cuts that one only', () => {
    const joints = join(wire(0, 0, 10, 0), wire(4, 0, 4, 8));
    expect(counts(joints)).toEqual([4, 3, 1]);
    expect(joints.nodeDegree[1]).toBe(3);
  });

  test('two ends make a corner', () => {
    const joints = join(wire(0, 0, 10, 0), wire(10, 6, 10, 0));
    expect(counts(joints)).toEqual([3, 2, 1]);
  });

  test('two pieces of one line meet end to end without overlapping', () => {
    const joints = join(wire(0, 0, 10, 0), wire(25, 0, 10, 0));
    expect(counts(joints)).toEqual([3, 2, 1]);
    expect(joints.faults).toEqual([]);
  });

  test('an end drawn 5 mm past the joint of one line is still the joint', () => {
    const joints = join(wire(0, 0, 10.005, 0), wire(10, 0, 25, 0));
    expect(counts(joints)).toEqual([3, 2, 1]);
    expect(joints.faults).toEqual([]);
    expect(joints.nodeX[1]).toBeCloseTo(10.0025, 12);
  });

  test('a rod through a crossing of wires is one node with both', () => {
    const joints = join(wire(0, 0, 10, 0), wire(5, -5, 5, 5), rod(5, 0, 0));
    expect(counts(joints)).toEqual([7, 6, 1]);
    expect(Math.max(...joints.nodeDegree)).toBe(6);
    expect(joints.snaps).toEqual([]);
  });

  test('a rod that hangs from a crossing of wires adds one piece', () => {
    expect(counts(join(wire(0, 0, 10, 0), wire(5, -5, 5, 5), rod(5, 0)))).toEqual([6, 5, 1]);
  });

  test('three conductors through one point make one node', () => {
    const joints = join(wire(-5, 0, 5, 0), wire(0, -5, 0, 5), wire(-4, -4, 4, 4));
    expect(counts(joints)).toEqual([7, 6, 1]);
    expect(joints.nodeDegree[1]).toBe(6);
  });

  test('a conductor shorter than the contact distance keeps two ends, and a middle where it is touched there', () => {
    const short = wire(0, 0, 0.014, 0);
    // both wires touch each other too, so the short one begins and ends at one node
    const loop = join(short, wire(0, 0, 0, 5), wire(0.014, 0, 0.014, -5));
    expect(counts(loop)).toEqual([3, 3, 1]);
    expect([loop.pieceNode1[0], loop.pieceNode2[0]]).toEqual([0, 0]);
    expect(counts(join(short, wire(0.005, 0, 0.005, 5)))).toEqual([3, 2, 1]);
    expect(counts(join(short, wire(0.009, 0, 0.009, 5)))).toEqual([3, 2, 1]);
    expect(join(short, wire(0.005, 0, 0.005, 5)).nodeDegree[0]).toBe(2);
    expect(join(short, wire(0.009, 0, 0.009, 5)).nodeDegree[1]).toBe(2);
    expect(counts(join(short, wire(0.007, 0, 0.007, 5)))).toEqual([4, 3, 1]);
  });

  test('three conductors in a triangle as small as the contact distance make one node', () => {
    // sides 10 mm, 14.9 mm and 20 mm; the 20 mm side is longer than the contact distance, but its ends are one by way of the others
    const cosine = (0.02 ** 2 + 0.01 ** 2 - 0.0149 ** 2) / (2 * 0.02 * 0.01);
    const corner = [0.01 * cosine, 0.01 * Math.sqrt(1 - cosine ** 2)] as const;
    const first = wire(-100 * corner[0], -100 * corner[1], 100 * corner[0], 100 * corner[1]);
    const third = wire(
      0.02 + 100 * (0.02 - corner[0]),
      -100 * corner[1],
      corner[0] - 100 * (0.02 - corner[0]),
      101 * corner[1],
    );
    expect(counts(join(first, wire(-2, 0, 2, 0), third))).toEqual([7, 6, 1]);
    expect(counts(join(first, wire(0, 0, 2, 0), third))).toEqual([6, 5, 1]);
    expect(counts(join(first, wire(2, 0, 0, 0), third))).toEqual([6, 5, 1]);
    expect(counts(join(first, wire(0.02, 0, -2, 0), third))).toEqual([6, 5, 1]);
  });

  test('a tail that overshoots by less than the contact distance is no piece of its own', () => {
    const joints = join(wire(0, 0, 10, 0), wire(4, -0.01, 4, 8));
    expect(counts(joints)).toEqual([4, 3, 1]);
  });

  test('a conductor that touches both ends of a short one leaves those ends two', () => {
    const joints = join(wire(0, 0, 0.02, 0), wire(0, 0, 0, 5), wire(0.02, 0, 0.02, 5));
    expect(counts(joints)).toEqual([4, 3, 1]);
  });
});

describe('metal that misses', () => {
  test('a rod 4 mm beside a wire touches it, and is listed', () => {
    const joints = join(wire(0, 0, 10, 0), rod(5, 0.004));
    expect(counts(joints)).toEqual([4, 3, 1]);
    expect(joints.snaps.map(({ distance }) => Math.round(distance * 1e6))).toEqual([4000]);
  });

  test('a rod 17 mm from a wire touches it by the tolerance of drawing, and is listed', () => {
    const joints = join(wire(0, 0, 10, 0), rod(5, 0.017));
    expect(counts(joints)).toEqual([4, 3, 1]);
    expect(joints.snaps).toHaveLength(1);
    expect(joints.snaps[0]).toMatchObject({ conductor: 0, other: 1, x: 5, y: 0, depth: 0.5 });
    expect(joints.snaps[0]!.distance).toBeCloseTo(0.017, 12);
    expect(nodes(joints)[1]).toEqual([5, 0.0085, 0.5]);
  });

  test('a gap of 4 mm between ends of one line is bridged, and is listed', () => {
    const joints = join(wire(0, 0, 10, 0), wire(10.004, 0, 20, 0));
    expect(counts(joints)).toEqual([3, 2, 1]);
    expect(joints.snaps.map(({ distance }) => Math.round(distance * 1e6))).toEqual([4000]);
  });

  test('metal 4 mm from metal touches, 6 mm does not', () => {
    const gap = (mm: number): Joints => join(wire(0, 0, 10, 0), wire(5, 0.01 + mm / 1000, 5, 5));
    expect(gap(4).componentCount).toBe(1);
    expect(gap(6).componentCount).toBe(2);
  });

  test('an end 20 mm short of a wire is a near miss and no joint', () => {
    const joints = join(wire(0, 0, 10, 0), wire(5, 0.03, 5, 5));
    expect(counts(joints)).toEqual([4, 2, 2]);
    expect(joints.snaps).toEqual([]);
    expect(joints.nearMisses).toHaveLength(1);
    expect(joints.nearMisses[0]).toMatchObject({ conductor: 1, other: 0, x: 5, y: 0.03, depth: 0.5 });
    expect(joints.nearMisses[0]!.distance).toBeCloseTo(0.03, 12);
  });

  test('either end of a conductor may miss', () => {
    const misses = join(wire(0, 0, 10, 0), wire(5, 5, 5, 0.03)).nearMisses;
    expect(misses.map(({ conductor, other, y }) => [conductor, other, y])).toEqual([[1, 0, 0.03]]);
  });

  test('thick metal touches by its radius', () => {
    const pipe: Row = { ...wire(0, 0, 10, 0), radius: 0.15 };
    expect(join(pipe, wire(5, 0.159, 5, 5)).componentCount).toBe(1);
    expect(join(wire(5, 0.159, 5, 5), pipe).componentCount).toBe(1);
    expect(join(pipe, wire(5, 0.161, 5, 5)).componentCount).toBe(2);
    const upright: Row = { ...wire(0, 0, 0, 10), radius: 0.15 };
    for (const [x, y] of [
      [0.159, 0],
      [-0.159, 0],
    ] as const) {
      expect(join(wire(x, y + 5, 30 * x, 5), upright).componentCount).toBe(1);
      expect(join(wire(y + 5, x, 5, 30 * x), pipe).componentCount).toBe(1);
    }
    expect(join(pipe, wire(5, 0.304, 5, 5)).nearMisses).toHaveLength(1);
  });

  test('what touches a wire beside thick metal is one node with it', () => {
    // 0.12 m apart along the wire, within the contact distance of 0.16 m of the pipe, which does not touch the branch
    const pipe: Row = { ...rod(5.12, -0.12, 0), radius: 0.15 };
    const rows = [wire(0, 0, 10, 0), wire(5, 0, 5, 5), pipe];
    expect(counts(join(...rows))).toEqual([6, 5, 1]);
  });

  test('a gap of 0.15 m or more is no near miss', () => {
    expect(join(wire(0, 0, 10, 0), wire(5, 0.159, 5, 5)).nearMisses).toHaveLength(1);
    expect(join(wire(0, 0, 10, 0), wire(5, 0.161, 5, 5)).nearMisses).toEqual([]);
  });

  test('an end near metal that its own conductor already touches is no near miss', () => {
    expect(join(wire(0, 0, 10, 0), wire(4, -0.1, 4, 8)).nearMisses).toEqual([]);
  });

  test('a joined end near other metal is no near miss', () => {
    const joints = join(wire(0, 0, 10, 0), wire(5, 0.1, 5, 5), wire(0, 0.1, 5, 0.1), wire(0, 0.1, 0, 9));
    expect(joints.nearMisses.map(({ conductor, other }) => [conductor, other])).toEqual([[0, 2]]);
  });

  test('of several conductors near a free end the nearest is told', () => {
    const joints = join(wire(0, 0, 10, 0), wire(5, 0.1, 5, 5), wire(5.06, 0.1, 9, 5));
    expect(joints.nearMisses.map(({ conductor, other }) => [conductor, other])).toEqual([
      [1, 2],
      [2, 1],
    ]);
  });

  test('wires that cross in plan at different depths do not touch', () => {
    const joints = join(wire(0, 0, 10, 0), wire(5, -5, 5, 5, 0.6));
    expect(counts(joints)).toEqual([4, 2, 2]);
  });

  test('wires laid on one another at a crossing touch', () => {
    const joints = join(wire(0, 0, 10, 0, 0.5), wire(5, -5, 5, 5, 0.51));
    expect(counts(joints)).toEqual([5, 4, 1]);
    expect(joints.snaps[0]!.distance).toBeCloseTo(0.01, 12);
    expect(nodes(joints)[1]).toEqual([5, 0, 0.505]);
  });

  test('no conductors make no joints', () => {
    expect(counts(join())).toEqual([0, 0, 0]);
  });
});

describe('insulated conductors touch at their ends only', () => {
  const insulated = (row: Row): Row => ({ ...row, insulated: true });

  test('a crossing is no contact', () => {
    expect(counts(join(wire(0, 0, 10, 0), insulated(wire(5, -5, 5, 5))))).toEqual([4, 2, 2]);
  });

  test('an insulated end joins the middle of a bare conductor', () => {
    expect(counts(join(wire(0, 0, 10, 0), insulated(wire(5, 0, 5, 5))))).toEqual([4, 3, 1]);
    expect(counts(join(insulated(wire(5, 0, 5, 5)), wire(0, 0, 10, 0)))).toEqual([4, 3, 1]);
  });

  test('a bare end on the middle of an insulated conductor is a near miss', () => {
    const joints = join(insulated(wire(0, 0, 10, 0)), wire(5, 0, 5, 5));
    expect(joints.componentCount).toBe(2);
    expect(joints.nearMisses.map(({ conductor, other }) => [conductor, other])).toEqual([[1, 0]]);
  });

  test('two insulated conductors join end to end, not end to middle', () => {
    expect(join(insulated(wire(0, 0, 10, 0)), insulated(wire(10, 0, 10, 5))).componentCount).toBe(1);
    expect(join(insulated(wire(0, 0, 10, 0)), insulated(wire(5, 0, 5, 5))).componentCount).toBe(2);
  });

  test('laid along a bare conductor it joins at both of its ends, which is no overlap', () => {
    const joints = join(wire(0, 0, 10, 0), insulated(wire(2, 0, 8, 0)));
    expect(counts(joints)).toEqual([4, 4, 1]);
    expect(joints.faults).toEqual([]);
  });
});
