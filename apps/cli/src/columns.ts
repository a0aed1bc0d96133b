// Rows of cells → lines with aligned columns, and long text → lines of a given width.

export interface Column {
  readonly align: 'left' | 'right';
  /** characters; longer cells are cut with an ellipsis */
  readonly most: number;
}

const GAP = '  ';

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
 * @returns one line a row, each column as wide as its widest cell
 */
export function aligned(columns: readonly Column[], rows: readonly (readonly string[])[]): readonly string[] {
  const cut = rows.map((row) => row.map((cell, c) => clipped(cell, columns[c].most)));
  const widths = columns.map((_, c) => Math.max(0, ...cut.map((row) => width(row[c]))));
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
