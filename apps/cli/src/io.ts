// What a command may touch of the world around it, so that tests can put their own in its place.

export interface Io {
  /** results */
  readonly out: (text: string) => void;
  /** everything else: progress, warnings, faults */
  readonly err: (text: string) => void;
  readonly outIsTerminal: boolean;
  readonly errIsTerminal: boolean;
  readonly env: Readonly<Record<string, string | undefined>>;
  /** milliseconds from any beginning; for progress only, never for results */
  readonly now: () => number;
}
