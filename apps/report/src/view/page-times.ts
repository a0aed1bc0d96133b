// How long an edit takes until its numbers stand on the page, measured by the page itself.

/** Names of the measures that the page leaves with the browser. */
export const FIRST_NUMBERS = 'edit to first numbers';
export const WHOLE_SHEET = 'edit to whole sheet';

/** Marks the edit that a run computes. */
export function markEdit(run: number): void {
  performance.mark(`edit ${run}`);
}

/** Measures from the edit to the frame in which what came of it is drawn. */
export function measureShown(run: number, early: boolean): void {
  requestAnimationFrame(() => {
    // a task after the frame's own: what was rendered is on the screen
    setTimeout(() => {
      if (performance.getEntriesByName(`edit ${run}`, 'mark').length > 0)
        performance.measure(early ? FIRST_NUMBERS : WHOLE_SHEET, `edit ${run}`);
    });
  });
}
