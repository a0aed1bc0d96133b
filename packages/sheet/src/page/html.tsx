// The sheet as one page that needs nothing else: no request, no font to fetch, and no script unless it carries one.
import type { Outcome } from '@ohmstead/study';
import { renderToString } from 'preact-render-to-string';
import { xmlText } from '../figure/xml-text.ts';
import { sheetCss } from './css.ts';
import { Sheet } from './sheet.tsx';

/** What a page carries so that its reader can have it computed anew; without scripts it reads the same. */
export interface PageProgram {
  /** the page's only script, which may not hold `</script` or `<!--` */
  readonly starter: string;
  /** SHA-256 of the starter in base64, by which the policy lets it run and nothing else */
  readonly starterDigest: string;
  /** data by id: JSON in which no `<` stands */
  readonly data: ReadonlyMap<string, string>;
}

/** What stands before and after a page's program. */
const AFTER_SHEET = '</main>';
const PAGE_END = '</body></html>';

/** Nothing may be loaded; the page's own style rules are all it has, and the program it carries is all that may run. */
function policyOf(program: PageProgram | undefined): string {
  const run =
    program === undefined
      ? []
      : [`script-src 'sha256-${program.starterDigest}' 'wasm-unsafe-eval'`, 'worker-src blob:'];
  return ["default-src 'none'", ...run, "style-src 'unsafe-inline'", 'img-src data:'].join('; ');
}

/** Data blocks and the script that uses them, as the last thing in the body. */
function scriptsOf({ starter, data }: PageProgram): string {
  const blocks = [...data].map(
    ([id, json]) => `<script type="application/json" id="${id}">${json}</script>\n`,
  );
  return `\n${blocks.join('')}<script>${starter}</script>\n`;
}

/** The head, but for the style rules: those are raw text in HTML and may not be escaped. */
function headOf(outcome: Outcome, program: PageProgram | undefined): string {
  const { title, program_version } = outcome.results;
  return renderToString(
    <>
      <meta charset="utf-8" />
      <meta http-equiv="Content-Security-Policy" content={policyOf(program)} />
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
 * @param program what the page carries to be computed anew, if anything
 * @returns the text of `index.html`; the same outcome gives the same bytes
 */
export function sheetHtml(outcome: Outcome, program?: PageProgram): string {
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
  const page = `<!doctype html>\n<html lang="en"><head>${headOf(outcome, program)}<style>\n${sheetCss}\n</style></head>${body}</html>\n`;
  const text = xmlText(page);
  const at = text.lastIndexOf(PAGE_END);
  return `${text.slice(0, at)}${program === undefined ? '' : scriptsOf(program)}${text.slice(at)}`;
}

/**
 * A page as it would be if it carried no program.
 * @param page as written by `sheetHtml`; any other is returned as it is
 */
export function withoutProgram(page: string): string {
  const from = page.lastIndexOf(AFTER_SHEET);
  const to = page.lastIndexOf(PAGE_END);
  if (from < 0 || to < from) return page;
  return `${page.slice(0, from + AFTER_SHEET.length)}${page.slice(to)}`.replace(
    /(?<=<meta http-equiv="Content-Security-Policy" content=")[^"]*/,
    policyOf(undefined),
  );
}
