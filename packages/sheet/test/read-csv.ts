// Reads tables back.

/** Reads CSV after RFC 4180, section 2. */
export function readCsv(csv: string): readonly (readonly string[])[] {
  const rows: string[][] = [[]];
  const cell = /(?:"((?:[^"]|"")*)"|([^",\r\n]*))(,|\r\n|$)/y;
  while (cell.lastIndex < csv.length) {
    const found = cell.exec(csv);
    if (found === null) throw new Error('not RFC 4180');
    rows[rows.length - 1].push(found[1]?.replaceAll('""', '"') ?? found[2]);
    if (found[3] === '\r\n' && cell.lastIndex < csv.length) rows.push([]);
  }
  return rows;
}
