// What the name of a zip entry must look like, so that no program unpacking it can be led out of its folder.

/** Longest name taken, bytes; far above any study's, and below the path limit of common file systems (4096). */
export const MAX_NAME_BYTES: number = 1024;

/** Says what is wrong with an entry's name, or nothing where it is a plain relative path. */
export function entryNameComplaint(name: string): string | undefined {
  if (name === '') return 'an entry has no name';
  if (new TextEncoder().encode(name).length > MAX_NAME_BYTES) {
    return `entry name is longer than ${MAX_NAME_BYTES} bytes`;
  }
  if (/\p{Cc}/u.test(name)) return 'entry name has control characters in it';
  if (name.includes('\\')) return 'entry name has a backslash in it; expected / between folders';
  if (name.startsWith('/') || /^[A-Za-z]:/.test(name)) {
    return 'entry name is absolute; expected a path relative to the zip';
  }
  const parts = (name.endsWith('/') ? name.slice(0, -1) : name).split('/');
  if (parts.includes('..')) return 'entry name leaves the zip; expected a path without ..';
  if (parts.includes('.') || parts.includes('')) {
    return 'entry name has an empty or . part; expected a plain path';
  }
  return undefined;
}
