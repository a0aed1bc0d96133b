// What verification may find, and each finding as a line for people.

export type Difference =
  /** listed in the manifest, or due by the recomputed study, but not in the pack */
  | { readonly kind: 'missing'; readonly path: string }
  /** in the pack, but not in the manifest or not due by the recomputed study */
  | { readonly kind: 'extra'; readonly path: string }
  /** bytes are not those that the manifest lists */
  | { readonly kind: 'digest'; readonly path: string; readonly stated: string; readonly found: string }
  /** the study in the pack cannot be read any more */
  | { readonly kind: 'study'; readonly path: string; readonly message: string }
  /** a value of the results, by its path in results.json */
  | { readonly kind: 'result'; readonly path: string; readonly stored: string; readonly computed: string }
  /** sheet, figure or table that is drawn otherwise from the recomputed study */
  | { readonly kind: 'rendering'; readonly path: string };

/** One line that says what differs, in lower case. */
export function differenceLine(difference: Difference): string {
  switch (difference.kind) {
    case 'missing':
      return `${difference.path}: missing from the pack`;
    case 'extra':
      return `${difference.path}: does not belong in the pack`;
    case 'digest':
      return `${difference.path}: changed after the pack was written; manifest has ${difference.stated}, found ${difference.found}`;
    case 'study':
      return `${difference.path}: the study cannot be read: ${difference.message}`;
    case 'result':
      return `results.json: ${difference.path}: stored ${difference.stored}, recomputed ${difference.computed}`;
    case 'rendering':
      return `${difference.path}: drawn from the recomputed study it has other bytes`;
  }
}
