// The style rules that every figure shares, on the page and in a file of its own.
import { LIGHT, paletteVariables, RAMP_STEPS } from './palette.ts';

/** Size of the text of a full-width figure, drawing units; on a phone it grows so that it stays legible. */
export const TEXT = 12;
/** By how much text grows on a phone; layouts leave room for it. */
export const PHONE_GROWTH = 1.75;

const RAMP_RULES = Array.from({ length: RAMP_STEPS }, (_, k) => `.fig .r${k}{fill:var(--ramp-${k})}`).join(
  '\n',
);

/** Rules of the figures, in terms of the palette's variables. */
export const figureCss: string = `
.fig{font-family:ui-sans-serif,"Inter","Helvetica Neue",Arial,"DejaVu Sans",sans-serif;font-size:${TEXT}px;font-variant-numeric:lining-nums tabular-nums}
.fig text{fill:var(--ink)}
.fig .soft{fill:var(--soft)}
.fig .strong{font-weight:600}
.fig .warn{fill:var(--beyond)}
.fig .surface-text{fill:var(--deep)}
.fig .halo{paint-order:stroke;stroke:var(--paper);stroke-width:3.2px;stroke-linejoin:round}
.fig .end{text-anchor:end}
.fig .mid{text-anchor:middle}
.fig .line{fill:none;stroke:var(--ink)}
.fig .tick{stroke:var(--soft);stroke-width:1}
.fig .axis{fill:none;stroke:var(--rule);stroke-width:1}
.fig .gridline{stroke:var(--rule);stroke-width:1}
.fig .border{fill:none;stroke:var(--soft);stroke-width:.8}
.fig .casing{fill:none;stroke:var(--paper);stroke-width:3.4;stroke-opacity:.55;stroke-linecap:round}
.fig .metal{fill:none;stroke:var(--ink);stroke-width:1.15;stroke-linecap:round}
.fig .plan .metal{stroke-width:1.6}
.fig .floating{stroke-dasharray:6 4;stroke-linecap:butt}
.fig .insulated{stroke-dasharray:1 3.2}
.fig .rod{fill:var(--paper);stroke:var(--ink);stroke-width:1.3}
.fig .dot{fill:var(--ink)}
.fig .inject{fill:var(--ink);stroke:var(--paper);stroke-width:1.2}
.fig .area{fill:none;stroke:var(--soft);stroke-width:1;stroke-dasharray:1.5 2.5}
.fig .area-touch{stroke:var(--deep);stroke-width:1.2;stroke-dasharray:7 2 1.5 2}
.fig .area-fill{fill:var(--field)}
.fig .veil{fill:var(--paper);fill-opacity:.66}
.fig .iso{fill:none;stroke:var(--ink);stroke-width:.6;stroke-opacity:.36}
.fig .iso-label{font-size:9.5px}
.fig .limit{fill:none;stroke:var(--beyond);stroke-width:1.8;stroke-linejoin:round}
.fig .dash{stroke-dasharray:7 4}
.fig .hatch-ground{fill:var(--beyond-ground)}
.fig .hatch-line{stroke:var(--beyond);stroke-width:1.6}
.fig .ring{fill:none;stroke:var(--ink);stroke-width:1.8}
.fig .leader{fill:none;stroke:var(--ink);stroke-width:1}
.fig .under{fill:none;stroke:var(--paper);stroke-width:4.2;stroke-opacity:.8}
.fig .disc{fill:var(--paper);fill-opacity:.82}
.fig .warn-line{stroke:var(--beyond)}
.fig .surface{fill:none;stroke:var(--deep);stroke-width:2;stroke-linejoin:round}
.fig .potential{fill:none;stroke:var(--ink);stroke-width:1.8}
.fig .faint{stroke-opacity:.4}
.fig .leak{fill:none;stroke:var(--deep)}
.fig .leak-core{fill:none;stroke:var(--paper)}
.fig .leak-rod{fill:var(--deep);stroke:var(--paper);stroke-width:1}
.fig .bar{fill:var(--deep)}
.fig .soils{fill:var(--deep);fill-opacity:.17}
.fig .soils-edge{fill:none;stroke:var(--deep);stroke-width:.8}
.fig .soils-bar{fill:var(--deep);fill-opacity:.2;stroke:var(--deep);stroke-width:1}
.fig .soils-median{stroke:var(--deep);stroke-width:2.4}
.fig .best-fit{fill:var(--ink)}
.fig .stairs{fill:none;stroke:var(--ink);stroke-width:1}
.fig .gridline.minor{stroke-opacity:.45}
.fig .reading{fill:var(--ink);stroke:var(--ink);stroke-width:1.3;stroke-linejoin:round}
.fig .reading.hollow{fill:var(--paper)}
.fig .resolved{fill:none;stroke:var(--soft);stroke-width:1.2;stroke-dasharray:1.5 3}
.fig .diagonal{fill:none;stroke:var(--soft);stroke-width:1.2;stroke-dasharray:9 3 2 3}
.fig .layer-line{stroke:var(--soft);stroke-width:1}
.fig .ground-line{stroke:var(--ink);stroke-width:1.6}
.fig .edge{fill:none;stroke:var(--soft);stroke-width:.6}
${RAMP_RULES}
`.trim();

/** Text of full-width figures grows on narrow screens; contour labels, which cannot, make room. */
export const figurePhoneCss: string = `
@media screen and (max-width:860px){.fig.wide{font-size:${TEXT * 1.25}px}.fig.wide .iso-label{font-size:11px}}
@media screen and (max-width:700px){.fig.wide{font-size:${TEXT * PHONE_GROWTH}px}.fig.wide .iso-label{display:none}}
`.trim();

/** The same rules with the light palette written out, for files that stand alone and for readers without variables. */
export function standaloneCss(): string {
  const colours = paletteVariables(LIGHT);
  return figureCss.replace(/var\((--[a-z0-9-]+)\)/g, (_, name: string) => {
    const colour = colours.get(name);
    if (colour === undefined) throw new Error(`no colour named ${name}`);
    return colour;
  });
}
