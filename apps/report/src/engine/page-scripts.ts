// The scripts that pages carry, as text put here by the build.
import type { PageScripts } from '@ohmstead/pack';

declare const OHMSTEAD_STARTER: string;
declare const OHMSTEAD_ENGINE: string;

export const pageScripts: PageScripts = { starter: OHMSTEAD_STARTER, engine: OHMSTEAD_ENGINE };
