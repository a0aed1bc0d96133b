// What the page says when the browser keeps nothing, or nothing more.

/** Words for a store that cannot be opened. */
export function refusedWords(error: unknown): string {
  return `This browser keeps nothing for this page (${reason(error)}): what is not saved as a file is lost when the page is closed.`;
}

/** Words for a study that could not be kept. */
export function unkeptWords(error: unknown): string {
  const full = error instanceof DOMException && error.name === 'QuotaExceededError';
  return full
    ? 'The browser’s room for this page is full: the last changes are not kept. Save the study as a file, or remove studies that are kept.'
    : `The last changes are not kept (${reason(error)}). Save the study as a file.`;
}

/** Words for a study that another window keeps as well. */
export const ELSEWHERE =
  'This study is open in another window as well: of the two, what is changed last is kept. Close one of them.';

function reason(error: unknown): string {
  const text = error instanceof Error ? error.message || error.name : String(error);
  return text.replace(/\.$/, '');
}
