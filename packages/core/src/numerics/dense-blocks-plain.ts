// The plain twin of the compiled products with dense blocks.

/** Numbers of a block of the list: first row, rows, first column, columns, place of the values, 1 where mirrored. */
export const LISTED = 6;

/** Columns as stored: an even number, the last one nothing. */
export function padded(columns: number): number {
  return columns + (columns & 1);
}

/** y += Σ B x */
export function multiplyPlain(
  list: Uint32Array,
  values: Float32Array,
  x: Float64Array,
  y: Float64Array,
): void {
  for (let b = 0; b < list.length; b += LISTED) {
    forward(list, b, values, x, y);
    if (list[b + 5] === 1) transposed(list, b, values, x, y);
  }
}

/** v_columns += Bᵀ v_rows, block after block */
export function foldPlain(list: Uint32Array, values: Float32Array, v: Float64Array): void {
  for (let b = 0; b < list.length; b += LISTED) transposed(list, b, values, v, v);
}

/** v_rows += B v_columns, from the last block to the first */
export function unfoldPlain(list: Uint32Array, values: Float32Array, v: Float64Array): void {
  for (let b = list.length - LISTED; b >= 0; b -= LISTED) forward(list, b, values, v, v);
}

function forward(list: Uint32Array, b: number, values: Float32Array, x: Float64Array, y: Float64Array): void {
  const [row, rows, column, columns] = [list[b]!, list[b + 1]!, list[b + 2]!, list[b + 3]!];
  let at = list[b + 4]!;
  for (let r = row; r < row + rows; r++) {
    let sum = 0;
    for (let c = 0; c < columns; c++) sum += values[at + c]! * x[column + c]!;
    y[r]! += sum;
    at += padded(columns);
  }
}

function transposed(
  list: Uint32Array,
  b: number,
  values: Float32Array,
  x: Float64Array,
  y: Float64Array,
): void {
  const [row, rows, column, columns] = [list[b]!, list[b + 1]!, list[b + 2]!, list[b + 3]!];
  let at = list[b + 4]!;
  for (let r = row; r < row + rows; r++) {
    const own = x[r]!;
    for (let c = 0; c < columns; c++) y[column + c]! += values[at + c]! * own;
    at += padded(columns);
  }
}
