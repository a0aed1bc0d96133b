// Reads markup back: its text, its parts, what is wrong with it.

/** Text between tags, spaces made plain. */
export function textOf(markup: string): string {
  return markup
    .replace(/<style>[\s\S]*?<\/style>/g, '')
    .replace(/<[^>]+>/g, '')
    .replace(/[\u202f\u00a0]/g, ' ')
    .replaceAll('&lt;', '<')
    .replaceAll('&quot;', '"')
    .replaceAll('&amp;', '&');
}

export function partOf(markup: string, id: string): string {
  const from = markup.indexOf(`<section class="part" id="${id}"`);
  const to = markup.indexOf('<section class="part"', from + 1);
  return markup.slice(from, to < 0 ? undefined : to);
}

/** Problems of nesting and quoting that an XML reader would refuse; none for well-formed markup. */
export function malformed(xml: string): readonly string[] {
  const open: string[] = [];
  const problems: string[] = [];
  const rest = xml.replace(
    /<(\/?)([a-zA-Z]+)((?:\s+[a-zA-Z0-9:-]+="[^"<]*")*)\s*(\/?)>/g,
    (_, close, name, __, empty) => {
      if (close === '/') {
        if (open.pop() !== name) problems.push(`</${name}>`);
      } else if (empty === '') open.push(name);
      return '';
    },
  );
  if (open.length > 0) problems.push(`open: ${open.join(' ')}`);
  if (rest.includes('<') || rest.includes(']]>')) problems.push(`bracket: ${rest.slice(0, 80)}`);
  if (/&(?!(amp|lt|gt|quot|#\d+);)/.test(xml)) problems.push('bare ampersand');
  return problems;
}
