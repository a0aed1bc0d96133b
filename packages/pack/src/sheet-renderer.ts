// The sheet as what packs are drawn with.
import { figures, sheetHtml, tables } from '@ohmstead/sheet';
import type { Renderer } from './renderer.ts';

export const sheetRenderer: Renderer = { sheetHtml, figures, tables };
