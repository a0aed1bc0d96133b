// Where the files of a study come from: a folder, an opened zip or the browser, behind one interface.

/** The files of a study by path relative to its folder, with `/` between the parts. */
export interface StudySource {
  /** every file, in any order */
  readonly paths: readonly string[];
  /** size in bytes, known before reading; `undefined` means that there is no such file */
  size(path: string): number | undefined;
  /** the whole file; asked only for paths that have a size */
  read(path: string): Uint8Array;
}

/**
 * A study whose files are in memory.
 * @param files bytes by path
 * @returns the source; `read` throws for a path that is not in the map
 */
export function sourceFromMap(files: ReadonlyMap<string, Uint8Array>): StudySource {
  return {
    paths: [...files.keys()].sort(),
    size: (path) => files.get(path)?.byteLength,
    read: (path) => {
      const bytes = files.get(path);
      if (bytes === undefined) throw new Error(`read of a path without a file: ${path}`);
      return bytes;
    },
  };
}
