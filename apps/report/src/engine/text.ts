// The engine's script as text, put here by the build.
declare const OHMSTEAD_ENGINE: string;

export const engineText: string = OHMSTEAD_ENGINE;
