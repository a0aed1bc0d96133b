// How large a zip may be before it is refused unread.

/** Entries of a zip; a study with a table for each of its figures stays below 100. */
export const MAX_ENTRIES: number = 2000;

/** Sum of the unpacked sizes, bytes (256 MiB): room for a million conductors, and memory on a small machine. */
export const MAX_TOTAL_BYTES: number = 256 * 1024 * 1024;
