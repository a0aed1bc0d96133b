// Estimates how much room a text takes, for layouts made without a browser.

/** Width of a character of the widest common sans serif, em (DejaVu Sans digits 0.636, mean of text 0.60). */
const CHARACTER_EM = 0.63;
/** Distance between base lines, em. */
export const LINE_EM = 1.25;

/** Width of a text, drawing units. */
export function textWidth(text: string, fontSize: number): number {
  return [...text].length * CHARACTER_EM * fontSize;
}

/** Size of lines set one below the other, drawing units. */
export function blockSize(
  lines: readonly string[],
  fontSize: number,
): { readonly width: number; readonly height: number } {
  return {
    width: Math.max(...lines.map((line) => textWidth(line, fontSize))),
    height: lines.length * LINE_EM * fontSize,
  };
}
