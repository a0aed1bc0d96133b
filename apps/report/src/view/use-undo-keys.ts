// Undo and redo by keyboard, where no text is being typed.
import { useEffect } from 'preact/hooks';
import type { BenchAction } from './bench.ts';

/** Fields have an undo of their own while they are typed in. */
function isTyped(target: EventTarget | null): boolean {
  return target instanceof HTMLInputElement || target instanceof HTMLTextAreaElement;
}

export function useUndoKeys(act: (action: BenchAction) => void): void {
  useEffect(() => {
    const keyed = (event: KeyboardEvent): void => {
      if (!(event.ctrlKey || event.metaKey) || event.altKey || isTyped(event.target)) return;
      const key = event.key.toLowerCase();
      if (key !== 'z' && key !== 'y') return;
      event.preventDefault();
      act({ kind: key === 'y' || event.shiftKey ? 'redo' : 'undo' });
    };
    addEventListener('keydown', keyed);
    return () => removeEventListener('keydown', keyed);
  }, [act]);
}
