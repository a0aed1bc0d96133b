// What opening files comes to: a draft, or the faults that keep it from being one.
import type { Fault } from '@ohmstead/study';
import type { Draft } from './draft.ts';

export type Opening =
  | { readonly kind: 'draft'; readonly draft: Draft }
  | { readonly kind: 'faults'; readonly faults: readonly Fault[] };
