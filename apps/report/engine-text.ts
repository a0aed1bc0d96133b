// The built engine's text, for builds that carry it.
import { readFileSync } from 'node:fs';
import { fileURLToPath } from 'node:url';

/**
 * What a build replaces in the sources: names and their values as code.
 * @throws Error where the engine is not built yet
 */
export function engineDefinitions(): Record<string, string> {
  const path = fileURLToPath(new URL('./dist/engine/engine.js', import.meta.url));
  return { OHMSTEAD_ENGINE: JSON.stringify(readFileSync(path, 'utf8')) };
}
