// Text ⇄ study, the chain from study to results, and their types.

export { type Fault, faultLine, InputFaults } from './fault.ts';
export type * from './ground.ts';
export {
  type ConductorRow,
  type ConductorRows,
  conductorColumns,
  readConductorsCsv,
} from './input/conductors-csv.ts';
export { type CsvRow, type CsvRows, csvRows } from './input/csv-rows.ts';
export { type CsvTable, readCsvTable } from './input/csv-table.ts';
export * from './input/defaults.ts';
export { studyJsonSchema } from './input/json-schema.ts';
export { readJson } from './input/json-text.ts';
export * from './input/json-value.ts';
export { MOST_CONDUCTORS } from './input/limits.ts';
export { loadStudy } from './input/load-study.ts';
export { loadSurvey, type SurveyFile } from './input/load-survey.ts';
export { nearestName } from './input/nearest-name.ts';
export { type NumberReading, readNumber } from './input/number-text.ts';
export { loadPoints, type PointTable } from './input/points-csv.ts';
export { STUDY_FILE } from './input/read-study-json.ts';
export { listed, quoted, shown } from './input/shown-value.ts';
export { type StudySource, sourceFromMap } from './input/source.ts';
export { conductorTables } from './input/study-rules.ts';
export { isSurveyColumn, surveyColumns } from './input/survey-columns.ts';
export {
  type ColumnSpec,
  type FoundColumn,
  type FoundColumns,
  findColumns,
  isRequiredColumn,
  usualName,
} from './input/table-columns.ts';
export { decodeText, type TextReading } from './input/text-encoding.ts';
export { toSi, type Unit, type UnitKind, unitsOf } from './input/units.ts';
export type * from './outcome.ts';
export type * from './results.ts';
export { fieldAt } from './run/field-at.ts';
export { layeredSoil } from './run/prepare.ts';
export { type SolveMemory, solveMemory } from './run/solve-memory.ts';
export { type SolveOptions, solveStudy } from './run/solve-study.ts';
export type { FieldPoint, FieldValue, SolvedField } from './run/solved-field.ts';
export { fitSurvey, type SurveyFit } from './run/survey-fit.ts';
export type * from './study.ts';
export { programVersion } from './version.ts';
