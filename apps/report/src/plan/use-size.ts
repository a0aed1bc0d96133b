// The size of an element on the screen, followed as it changes.
import type { RefObject } from 'preact';
import { useLayoutEffect, useState } from 'preact/hooks';
import type { Size } from './view.ts';

const UNKNOWN: Size = { width: 760, height: 560 };

export function useSize(element: RefObject<Element | null>): Size {
  const [size, setSize] = useState<Size>(UNKNOWN);
  useLayoutEffect(() => {
    const watched = element.current;
    if (watched === null) return;
    const observer = new ResizeObserver(([entry]) => {
      if (entry === undefined) return;
      const { width, height } = entry.contentRect;
      if (width > 0 && height > 0) setSize({ width, height });
    });
    observer.observe(watched);
    return () => observer.disconnect();
  }, [element]);
  return size;
}
