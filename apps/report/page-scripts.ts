// The built scripts that pages carry as text, for builds that take them in.
import { readFileSync } from 'node:fs';
import { fileURLToPath } from 'node:url';

const textOf = (name: string): string =>
  readFileSync(fileURLToPath(new URL(`./dist/engine/${name}.js`, import.meta.url)), 'utf8').trimEnd();

/**
 * What a build replaces in the sources: names and their values as code.
 * @throws Error where the scripts are not built yet
 */
export function pageScriptDefinitions(): Record<string, string> {
  return {
    OHMSTEAD_STARTER: JSON.stringify(textOf('starter')),
    OHMSTEAD_ENGINE: JSON.stringify(textOf('engine')),
  };
}
