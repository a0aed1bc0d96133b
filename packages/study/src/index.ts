// Text ⇄ study, the chain from study to results, and their types.
export type * from './outcome.ts';
export type * from './results.ts';
export type * from './study.ts';
export { type Fault, faultLine, InputFaults } from './fault.ts';
