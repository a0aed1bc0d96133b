// Turns names into file names and identifiers: lower-case ASCII, never twice the same.

/** Longest slug, characters; longer names are cut so that every file system takes them. */
const LONGEST = 48;

/** `33 kV bus` → `33-kv-bus`; a name without any letter or digit gives `case`. */
export function slug(name: string): string {
  const plain = name
    .normalize('NFKD')
    .replace(/[\u0300-\u036f]/g, '')
    .toLowerCase();
  const kept = plain
    .replace(/[^a-z0-9]+/g, '-')
    .slice(0, LONGEST)
    .replace(/^-+|-+$/g, '');
  return kept === '' ? 'case' : kept;
}

/** One slug a name, in order; a repeated one takes -2, -3, … */
export function uniqueSlugs(names: readonly string[]): readonly string[] {
  const taken = new Set<string>();
  return names.map((name) => {
    const base = slug(name);
    let candidate = base;
    for (let n = 2; taken.has(candidate); n += 1) candidate = `${base}-${n}`;
    taken.add(candidate);
    return candidate;
  });
}
