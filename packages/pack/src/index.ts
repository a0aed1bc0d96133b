// Review packs: study and outcome → zip, and back with every digest and number checked.
export { type Comparison, compareResults, SAME_NUMBER_TOLERANCE } from './compare-results.ts';
export { compareTexts, type TextComparison, type TextDifference } from './compare-texts.ts';
export { type Difference, differenceLine } from './difference.ts';
export { jsonText } from './json-text.ts';
export type { Manifest, ManifestEntry } from './manifest.ts';
export {
  ENGINE_BLOCK,
  type PageRecord,
  type PageScripts,
  RECORD_BLOCK,
  type RecordFile,
} from './page-program.ts';
export { type Pack, readPack } from './read-pack.ts';
export type { Renderer } from './renderer.ts';
export { sheetRenderer } from './sheet-renderer.ts';
export { sheetTexts } from './sheet-texts.ts';
export { sourceFromZip } from './source-from-zip.ts';
export { type Solve, type Verification, type VerifyOptions, verifyPack } from './verify-pack.ts';
export { type PackOptions, writePack } from './write-pack.ts';
export { MAX_ENTRIES, MAX_TOTAL_BYTES } from './zip-limits.ts';
export { writeZip } from './zip-write.ts';
