// Fields by which files and folders are opened, set as words.
import type { VNode } from 'preact';

/** Lets a file field take a whole folder; every browser knows it, no standard types do. */
const WHOLE_FOLDER: Readonly<Record<string, string>> = { webkitdirectory: '' };

export function FilePicks({ open }: { readonly open: (list: readonly File[]) => void }): VNode {
  const picked = (field: HTMLInputElement): void => {
    const list = [...(field.files ?? [])];
    // the same file may be picked again after it was changed
    field.value = '';
    if (list.length > 0) open(list);
  };
  return (
    <>
      <label class="pick">
        Open a study folder
        <input type="file" {...WHOLE_FOLDER} onChange={(event) => picked(event.currentTarget)} />
      </label>
      <label class="pick">
        Open files, a zip or a review pack
        <input
          type="file"
          multiple
          accept=".json,.csv,.zip"
          onChange={(event) => picked(event.currentTarget)}
        />
      </label>
    </>
  );
}
