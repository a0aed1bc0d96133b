// Keeps markup free of characters that XML does not allow, whatever a name contains.

const REPLACEMENT = '\ufffd';

/** Whether a code unit alone may stand in XML: the production Char of XML 1.0 (fifth edition, 2.2). */
function allowed(unit: number): boolean {
  if (unit < 0x20) return unit === 0x09 || unit === 0x0a || unit === 0x0d;
  return unit < 0xd800 || (unit > 0xdfff && unit < 0xfffe);
}

/** Whether a full pair of surrogates begins at a place of the text. */
function pairAt(text: string, at: number): boolean {
  const high = text.charCodeAt(at);
  const low = text.charCodeAt(at + 1);
  return high >= 0xd800 && high <= 0xdbff && low >= 0xdc00 && low <= 0xdfff;
}

/**
 * Markup with each forbidden character as U+FFFD, so that a damaged name is seen and not dropped, and without the
 * sequence `]]>`, which XML allows nowhere in text (XML 1.0, 2.4).
 */
export function xmlText(markup: string): string {
  return withoutForbidden(markup).replaceAll(']]>', ']]&gt;');
}

function withoutForbidden(text: string): string {
  const parts: string[] = [];
  let from = 0;
  for (let at = 0; at < text.length; at += 1) {
    if (allowed(text.charCodeAt(at))) continue;
    if (pairAt(text, at)) {
      at += 1;
      continue;
    }
    parts.push(text.slice(from, at), REPLACEMENT);
    from = at + 1;
  }
  return parts.length === 0 ? text : parts.join('') + text.slice(from);
}
