// Hands a file to the browser's downloads.

/** @param name of the file, a plain name */
export function download(name: string, content: BlobPart, type: string): void {
  const url = URL.createObjectURL(new Blob([content], { type }));
  const link = document.createElement('a');
  link.href = url;
  link.download = name;
  link.click();
  // the click has begun the download, which holds the content from then on
  URL.revokeObjectURL(url);
}

/** A title as the beginning of a file's name. */
export function fileStem(title: string): string {
  const stem = title
    .toLowerCase()
    .replaceAll(/[^a-z0-9]+/g, '-')
    .replaceAll(/^-|-$/g, '');
  return stem === '' ? 'study' : stem;
}
