// Text ⇄ study, the chain from study to results, and their types.

export { type Fault, faultLine, InputFaults } from './fault.ts';
export type * from './ground.ts';
export * from './input/defaults.ts';
export { studyJsonSchema } from './input/json-schema.ts';
export { loadStudy } from './input/load-study.ts';
export { loadSurvey, type SurveyFile } from './input/load-survey.ts';
export { loadPoints, type PointTable } from './input/points-csv.ts';
export { type StudySource, sourceFromMap } from './input/source.ts';
export type * from './outcome.ts';
export type * from './results.ts';
export { type FieldPoint, type FieldValue, fieldAt } from './run/field-at.ts';
export { layeredSoil } from './run/prepare.ts';
export { type SolveOptions, solveStudy } from './run/solve-study.ts';
export { fitSurvey, type SurveyFit } from './run/survey-fit.ts';
export type * from './study.ts';
export { programVersion } from './version.ts';
