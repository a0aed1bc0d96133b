// Files dropped anywhere on the page.
import { useEffect, useRef } from 'preact/hooks';

/** @param take is given the files of a drop */
export function useDroppedFiles(take: (list: readonly File[]) => void): void {
  const latest = useRef(take);
  latest.current = take;
  useEffect(() => {
    const over = (event: DragEvent): void => event.preventDefault();
    const drop = (event: DragEvent): void => {
      event.preventDefault();
      const list = event.dataTransfer?.files;
      if (list !== undefined && list.length > 0) latest.current([...list]);
    };
    addEventListener('dragover', over);
    addEventListener('drop', drop);
    return () => {
      removeEventListener('dragover', over);
      removeEventListener('drop', drop);
    };
  }, []);
}
