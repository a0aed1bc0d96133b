// Offers a figure or a table as a file, where the page hands out files.
import type { VNode } from 'preact';
import { useDesk } from '../desk/use-desk.ts';
import { WordButton } from './word-button.tsx';

/** @param props.file name of a figure or table of the sheet: `leakage.svg`, `cases.csv` */
export function Download({ file }: { file: string }): VNode | null {
  const desk = useDesk();
  const download = desk?.download;
  if (download === undefined) return null;
  return (
    <span class="download">
      {' '}
      <WordButton press={() => download(file)} of={file}>
        download
      </WordButton>
    </span>
  );
}
