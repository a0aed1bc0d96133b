// Results → figures (SVG), tables (CSV) and the sheet (HTML); the same code in Node and in the browser.
export { type FigureFile, figures } from './figure/figures.tsx';
export { sheetCss } from './page/css.ts';
export { sheetHtml } from './page/html.tsx';
export { Sheet } from './page/sheet.tsx';
export { type TableFile, tables } from './table/tables.ts';
