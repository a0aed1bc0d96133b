// The exit statuses that scripts rely on.

export const DONE = 0;
export const PROGRAM_FAULT = 1;
export const INPUT_FAULT = 2;
/** `--strict` and a limit exceeded, or `verify` found a difference */
export const FINDING = 3;

export type ExitStatus = typeof DONE | typeof PROGRAM_FAULT | typeof INPUT_FAULT | typeof FINDING;
