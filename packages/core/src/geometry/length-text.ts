// Lengths and places as words for messages.

/** `3.20 m` */
export function metres(value: number): string {
  return `${unsignedZero(value.toFixed(2))} m`;
}

/** `4 mm`, `0.4 mm` */
export function millimetres(value: number): string {
  const mm = value * 1000;
  return `${unsignedZero(mm.toFixed(Math.abs(mm) < 10 ? 1 : 0).replace(/\.0$/, ''))} mm`;
}

/** `(12.00, 3.50) m` */
export function planPlace(x: number, y: number): string {
  return `(${unsignedZero(x.toFixed(2))}, ${unsignedZero(y.toFixed(2))}) m`;
}

function unsignedZero(digits: string): string {
  return /^-0(\.0*)?$/.test(digits) ? digits.slice(1) : digits;
}
