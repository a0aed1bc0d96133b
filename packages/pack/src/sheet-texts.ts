// The sheet in a page: its texts as a browser has them, its tags, and what stands around it.

/** A tag; a `>` inside a quoted attribute does not end it. */
const TAG: RegExp = /<(?:[^>"']|"[^"]*"|'[^']*')*>/g;
/** The four characters that the sheet writes as references; it writes no others. */
const REFERENCES: Readonly<Record<string, string>> = {
  '&lt;': '<',
  '&gt;': '>',
  '&quot;': '"',
  '&amp;': '&',
};

/**
 * @param html of a page with the sheet in its `main` element
 * @returns its texts in order, those of blanks alone left out
 * @throws Error where the page has no `main`
 */
export function sheetTexts(html: string): readonly string[] {
  return sheetOf(html)
    .split(TAG)
    .filter((text) => text.trim() !== '')
    .map((text) => text.replaceAll(/&(?:lt|gt|quot|amp);/g, (reference) => REFERENCES[reference]!));
}

/** The tags of the sheet in order. */
export function sheetTags(html: string): readonly string[] {
  return sheetOf(html).match(TAG) ?? [];
}

/** The page without its sheet; undefined where it has none. */
export function aroundSheet(html: string): string | undefined {
  const at = placeOf(html);
  return at && `${html.slice(0, at[0])}${html.slice(at[1])}`;
}

function sheetOf(html: string): string {
  const at = placeOf(html);
  if (at === undefined) throw new Error('the page has no main element');
  return html.slice(at[0], at[1]);
}

function placeOf(html: string): readonly [number, number] | undefined {
  const begin = html.indexOf('<main');
  const end = html.lastIndexOf('</main>');
  return begin < 0 || end < begin ? undefined : [begin, end];
}
