// Work of a live page that waits for its turn: one piece a task, so that the page answers in between.

const waiting: (() => void)[] = [];
let called = false;

function next(): void {
  called = false;
  waiting.shift()?.();
  call();
}

function call(): void {
  if (called || waiting.length === 0) return;
  called = true;
  setTimeout(next);
}

/**
 * Does something in a task of its own, after what waits already.
 * @returns takes it back
 */
export function inTurn(act: () => void): () => void {
  waiting.push(act);
  call();
  return () => {
    const at = waiting.indexOf(act);
    if (at >= 0) waiting.splice(at, 1);
  };
}
