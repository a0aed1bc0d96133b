// The texts of the page's sheet, and the marks at those that are contradicted.

export interface Contradicted {
  readonly index: number;
  readonly computed: string;
}

const MARK = 'data-recomputed';

/** Text nodes of the sheet in order, those of blanks alone left out. */
export function printedTexts(sheet: Element): readonly Text[] {
  const walker = document.createTreeWalker(sheet, NodeFilter.SHOW_TEXT);
  const texts: Text[] = [];
  for (let node = walker.nextNode(); node !== null; node = walker.nextNode())
    if (node instanceof Text && node.data.trim() !== '') texts.push(node);
  return texts;
}

/** Takes the marks of an earlier check away, and puts new ones at the elements whose text is contradicted. */
export function markContradicted(texts: readonly Text[], contradicted: readonly Contradicted[]): void {
  for (const marked of document.querySelectorAll(`[${MARK}]`)) marked.removeAttribute(MARK);
  for (const { index, computed } of contradicted) {
    const element = texts[index]?.parentElement;
    if (element === null || element === undefined) continue;
    const earlier = element.getAttribute(MARK);
    element.setAttribute(MARK, earlier === null ? computed : `${earlier}; ${computed}`);
  }
}

/** Name of the part of the sheet that a text stands in. */
export function partOf(text: Text | undefined): string {
  const heading = text?.parentElement?.closest('section.part')?.querySelector('h2');
  return heading?.textContent?.trim() || 'the title';
}

/** Unfolds what hides a text and brings it into view. */
export function showText(text: Text): void {
  for (let at = text.parentElement; at !== null; at = at.parentElement)
    if (at instanceof HTMLDetailsElement) at.open = true;
  text.parentElement?.scrollIntoView({ block: 'center' });
}
