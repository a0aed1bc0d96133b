// What a pack needs of the sheet: the document, its figures and its tables.
import type { PageProgram } from '@ohmstead/sheet';
import type { Outcome } from '@ohmstead/study';

export interface Renderer {
  /** one self-contained HTML document, which computes itself anew where it is given the program to */
  readonly sheetHtml: (outcome: Outcome, program?: PageProgram) => string;
  /** names without folder and ending */
  readonly figures: (outcome: Outcome) => readonly { readonly name: string; readonly svg: string }[];
  readonly tables: (outcome: Outcome) => readonly { readonly name: string; readonly csv: string }[];
}
