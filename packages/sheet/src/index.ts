// Results → figures (SVG), tables (CSV) and the sheet (HTML); the same code in Node and in the browser.
export {
  type Desk,
  DeskContext,
  type PastedTable,
  type QuantityKind,
  type Reading,
  type SectionId,
  type SectionState,
  type StudyPath,
} from './desk/desk.ts';
export { pathText, sectionOfInput } from './desk/study-path.ts';
export { useTurn } from './desk/use-turn.ts';
export { type FigureFile, figures } from './figure/figures.tsx';
export { Hatch } from './figure/hatch.tsx';
export { LeakageFigure, leakageClassText, leakageThickness, rodRadius } from './figure/leakage.tsx';
export { MapFigure } from './figure/map.tsx';
export { MapGround } from './figure/map-ground.tsx';
export { MapKey } from './figure/map-key.tsx';
export { PlanFigure, planPlate } from './figure/plan.tsx';
export { ProfileFigure } from './figure/profile.tsx';
export { titles } from './figure/titles.ts';
export { lengthUnit, place } from './format/length.ts';
export { measured, percent, quantity } from './format/number.ts';
export { quantityText } from './format/quantity-text.ts';
export { latticeExtent } from './geometry/contours.ts';
export {
  type ConductorCurrent,
  conductorCurrents,
  type LeakageDrawing,
  leakageDrawing,
} from './geometry/leakage.ts';
export { assessedFor, type MapDrawing, type MapKind, mapDrawing } from './geometry/map-drawing.ts';
export { type Plate, plateOf } from './geometry/plate.ts';
export { roundLength, ticksIn } from './geometry/ticks.ts';
export { sheetCss } from './page/css.ts';
export { type PageProgram, sheetHtml, withoutProgram } from './page/html.tsx';
export { Questions } from './page/questions.tsx';
export { Sheet } from './page/sheet.tsx';
export type { TableFile } from './table/csv.ts';
export { tables } from './table/tables.ts';
export { answerOf, subjectVoltage } from './verdict/answer.ts';
export type { Finding } from './verdict/finding.ts';
export { governingCase, type VerdictRow, verdictRows } from './verdict/rows.ts';
export { reachWords, type SoilBandRow, soilBandRows, soilBandSentences } from './verdict/soil-band.ts';
