// The style rules of the page: type, colour, dark reading, phone and print, put together.
import { DARK, LIGHT, paletteCss } from '../figure/palette.ts';
import { figureCss, figurePhoneCss } from '../figure/style.ts';
import { deskCss } from './desk-css.ts';
import { layoutCss } from './layout-css.ts';
import { printCss } from './print-css.ts';
import { textCss } from './text-css.ts';

const colourCss = `
:root{color-scheme:light;${paletteCss(LIGHT)}}
@media screen and (prefers-color-scheme:dark){:root{color-scheme:dark;${paletteCss(DARK)}}}
`.trim();

/** All rules of the sheet, for a page's style element. */
export const sheetCss: string = [
  colourCss,
  layoutCss,
  textCss,
  figureCss,
  figurePhoneCss,
  deskCss,
  printCss,
].join('\n');
