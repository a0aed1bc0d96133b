// Work of a live page that waits for its turn: one piece a frame, after what was drawn before is on the screen.

/** A page that is not shown has no frames; its work is done after this long, ms. */
const WITHOUT_FRAME_MS = 200;

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
  afterFrame(next);
}

/** In a task of its own, once the present frame is drawn. */
function afterFrame(act: () => void): void {
  let done = false;
  const once = (): void => {
    if (done) return;
    done = true;
    act();
  };
  requestAnimationFrame(() => setTimeout(once));
  setTimeout(once, WITHOUT_FRAME_MS);
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
