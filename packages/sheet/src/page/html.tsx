// The sheet as one page that needs nothing else: no script, no request, no font to fetch.
import type { Outcome } from '@ohmstead/study';
import { renderToString } from 'preact-render-to-string';
import { xmlText } from '../figure/xml-text.ts';
import { sheetCss } from './css.ts';
import { Sheet } from './sheet.tsx';

/** Nothing may be loaded or run; the page's own style rules are all it has. */
const POLICY = "default-src 'none'; style-src 'unsafe-inline'; img-src data:";

/** The head, but for the style rules: those are raw text in HTML and may not be escaped. */
function headOf(outcome: Outcome): string {
  const { title, program_version } = outcome.results;
  return renderToString(
    <>
      <meta charset="utf-8" />
      <meta http-equiv="Content-Security-Policy" content={POLICY} />
      <meta name="viewport" content="width=device-width, initial-scale=1" />
      <meta name="color-scheme" content="light dark" />
      <meta name="generator" content={`Ohmstead ${program_version}`} />
      <title>{`${title} — earthing calculation`}</title>
    </>,
  );
}

/**
 * The sheet as a self-contained HTML page.
 * @param outcome of a solved study
 * @returns the text of `index.html`; the same outcome gives the same bytes
 */
export function sheetHtml(outcome: Outcome): string {
  const body = renderToString(
    <body>
      <a class="skip" href="#sheet">
        Skip to the sheet
      </a>
      <main id="sheet">
        <Sheet outcome={outcome} />
      </main>
    </body>,
  );
  const page = `<!doctype html>\n<html lang="en"><head>${headOf(outcome)}<style>\n${sheetCss}\n</style></head>${body}</html>\n`;
  return xmlText(page);
}
