// The inner loops of a map in the compiled surface kernel, on the kernel's own memory.
import { BYTES_A_DOUBLE as BYTES, doublesAt, kernelOf, place } from '../kernels/instance.ts';
import { surfaceBytes } from '../kernels/surface-bytes.ts';
import type { MapArithmetic } from './map-arithmetic.ts';

/** @returns undefined where there is no kernel, or no memory of that size: plain code then takes over */
export function kernelArithmetic(doubles: number): MapArithmetic | undefined {
  const kernel = kernelOf(surfaceBytes);
  const [first] = (kernel && place(kernel, [], doubles)) ?? [];
  if (kernel === undefined || first === undefined) return undefined;
  const transfer = kernel.find('transfer');
  const spread = kernel.find('spread');
  const wires = kernel.find('wires');
  const sources = kernel.find('sources');
  const at = (index: number): number => first + index * BYTES;
  return {
    numbers: doublesAt(kernel, first, doubles),
    transfer(matrix, limits, from, to, columns, rows) {
      const [east, north] = [from.eastward * BYTES, from.northward * BYTES];
      const [toEast, toNorth] = [to.eastward * BYTES, to.northward * BYTES];
      transfer(at(matrix), at(limits), at(from.at), east, north, at(to.at), toEast, toNorth, columns, rows);
    },
    spread(expansions, columns, rows, basis, side, room, values, rowStep) {
      spread(at(expansions), columns, rows, at(basis), side, at(room), at(values), rowStep * BYTES);
    },
    wires(pieces, count, cases, p) {
      const [row, step] = [p.rowStep * BYTES, p.caseStep * BYTES];
      wires(at(pieces), count, cases, at(p.xs), at(p.ys), p.columns, p.rows, at(p.values), row, step);
    },
    sources(list, count, cases, { table, at: bins }, p) {
      const [row, step] = [p.rowStep * BYTES, p.caseStep * BYTES];
      const to = [at(p.xs), at(p.ys), p.columns, p.rows, at(p.values), row, step] as const;
      sources(at(list), count, cases, at(bins), table.perSquare, ...to);
    },
  };
}
