// Rows of cells → lines with aligned columns, and long text → lines of a given width.

export interface Column {
  readonly align: 'left' | 'right';
  /** characters, longer cells are cut with an ellipsis; `rest`: what other columns leave of the line */
  readonly most: number | 'rest';
}

const GAP = '  ';
/** A column that takes the rest of the line keeps this many characters, however wide the others are. */
const LEAST_REST = 12;

/** Characters as a terminal counts them, near enough: code points. */
function width(text: string): number {
  return [...text].length;
}

/** The text, cut to so many characters. */
export function clipped(text: string, most: number): string {
  const characters = [...text];
  return characters.length <= most ? text : `${characters.slice(0, most - 1).join('')}…`;
}

/**
 * Lines of a table.
 * @param columns how each column stands
 * @param rows cells, one a column
 * @param line characters of a line, for the column that takes the rest
 * @returns one line a row, each column as wide as its widest cell
 */
export function aligned(
  columns: readonly Column[],
  rows: readonly (readonly string[])[],
  line: number = Infinity,
): readonly string[] {
  const widest = (c: number): number => rows.reduce((most, row) => Math.max(most, width(row[c])), 0);
  const others = columns.reduce(
    (sum, { most }, c) => sum + (most === 'rest' ? 0 : Math.min(most, widest(c))),
    GAP.length * (columns.length - 1),
  );
  const limits = columns.map(({ most }) => (most === 'rest' ? Math.max(LEAST_REST, line - others) : most));
  const cut = rows.map((row) => row.map((cell, c) => clipped(cell, limits[c])));
  const widths = columns.map((_, c) => Math.min(limits[c], widest(c)));
  return cut.map((row) => {
    const cells = row.map((cell, c) => {
      const blank = ' '.repeat(widths[c] - width(cell));
      return columns[c].align === 'left' ? cell + blank : blank + cell;
    });
    return cells.join(GAP).trimEnd();
  });
}

/**
 * Breaks text between words.
 * @param text one paragraph
 * @param most characters of a line
 * @param indent blanks before each line but the first
 */
export function wrapped(text: string, most: number, indent: number = 0): readonly string[] {
  const lines: string[] = [];
  let line = '';
  for (const word of text.split(/\s+/).filter((part) => part !== '')) {
    const room = most - (lines.length === 0 ? 0 : indent);
    if (line !== '' && width(line) + 1 + width(word) > room) {
      lines.push(line);
      line = word;
    } else {
      line = line === '' ? word : `${line} ${word}`;
    }
  }
  lines.push(line);
  return lines.map((each, index) => (index === 0 ? each : ' '.repeat(indent) + each));
}
