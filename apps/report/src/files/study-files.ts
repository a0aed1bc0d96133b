// Files that the user opens or drops, as the files of a study.

/**
 * Reads files by their path below the study's folder: a folder that was picked or dropped whole loses its own name.
 * @returns paths in sorted order, so that the same files give the same study however they were picked
 */
export async function studyFiles(list: readonly File[]): Promise<Map<string, Uint8Array>> {
  const paths = list.map((file) => (file.webkitRelativePath === '' ? file.name : file.webkitRelativePath));
  const folder = commonFolder(paths);
  const read = await Promise.all(list.map(async (file) => new Uint8Array(await file.arrayBuffer())));
  return new Map(
    paths
      .map((path, i): [string, Uint8Array] => [path.slice(folder.length), read[i]!])
      .sort(([a], [b]) => (a < b ? -1 : 1)),
  );
}

/** `yard/` when every path begins with it, otherwise nothing. */
function commonFolder(paths: readonly string[]): string {
  const first = paths[0]?.split('/')[0];
  if (first === undefined || !paths.every((path) => path.startsWith(`${first}/`))) return '';
  return `${first}/`;
}
