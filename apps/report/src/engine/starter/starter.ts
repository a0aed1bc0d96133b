// The script of a review pack's sheet: puts the strip above the sheet that computes it anew.
import { element } from './element.ts';
import { pageContent } from './record.ts';
import { recomputeStrip } from './strip.ts';
import { starterCss } from './style.ts';

const main = document.querySelector('main');
if (main !== null) {
  document.head.append(element('style', {}, starterCss));
  main.before(stripOrWhyNot(main));
}

function stripOrWhyNot(sheet: Element): HTMLElement {
  try {
    return recomputeStrip(pageContent(document), sheet);
  } catch (error) {
    const word = `This page cannot be recomputed: ${error instanceof Error ? error.message : String(error)}.`;
    return element('aside', { class: 'recompute' }, element('p', { role: 'alert' }, word));
  }
}
