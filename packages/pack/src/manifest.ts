// The manifest of a review pack: which entries it has, how large they are and their digests.
import { type Fault, InputFaults } from '@ohmstead/study';
import { sha256 } from './sha256.ts';

export const MANIFEST_NAME: string = 'manifest.json';

export interface ManifestEntry {
  readonly path: string;
  readonly bytes: number;
  /** 64 lower-case hexadecimal digits */
  readonly sha256: string;
}

export interface Manifest {
  readonly format: 'ohmstead-pack';
  readonly version: 1;
  readonly program_version: string;
  /** every entry of the pack but the manifest, sorted by path */
  readonly entries: readonly ManifestEntry[];
}

/**
 * Lists the entries of a pack with their digests.
 * @param entries contents by path, without a manifest
 * @param programVersion of the program that computed them
 */
export async function makeManifest(
  entries: ReadonlyMap<string, Uint8Array>,
  programVersion: string,
): Promise<Manifest> {
  const listed: ManifestEntry[] = [];
  for (const path of [...entries.keys()].toSorted()) {
    const content = entries.get(path) ?? new Uint8Array();
    listed.push({ path, bytes: content.length, sha256: await sha256(content) });
  }
  return { format: 'ohmstead-pack', version: 1, program_version: programVersion, entries: listed };
}

/**
 * Reads a manifest and checks its shape.
 * @param content of `manifest.json`; undefined where the zip has none
 * @param file what to call the zip in faults
 * @throws InputFaults where it is not the manifest of a review pack
 */
export function readManifest(content: Uint8Array | undefined, file: string): Manifest {
  if (content === undefined) {
    throw fault(
      file,
      'not-a-pack',
      `no ${MANIFEST_NAME} in it; expected a review pack as written by solve --pack`,
    );
  }
  const json = parse(content);
  if (!isRecord(json)) throw fault(file, 'bad-manifest', `${MANIFEST_NAME} is not a JSON object`);
  if (json.format !== 'ohmstead-pack') {
    throw fault(file, 'not-a-pack', `${MANIFEST_NAME} does not state the format "ohmstead-pack"`);
  }
  if (json.version !== 1) {
    throw fault(
      file,
      'pack-version',
      `pack version ${JSON.stringify(json.version)}; this program reads version 1`,
    );
  }
  const { program_version: programVersion, entries } = json;
  if (typeof programVersion !== 'string' || !Array.isArray(entries) || !entries.every(isManifestEntry)) {
    throw fault(
      file,
      'bad-manifest',
      `${MANIFEST_NAME} lacks program_version or a list of path, bytes and sha256`,
    );
  }
  return { format: 'ohmstead-pack', version: 1, program_version: programVersion, entries };
}

function parse(content: Uint8Array): unknown {
  try {
    return JSON.parse(new TextDecoder('utf-8', { fatal: true }).decode(content));
  } catch {
    return undefined;
  }
}

function isRecord(value: unknown): value is Readonly<Record<string, unknown>> {
  return typeof value === 'object' && value !== null && !Array.isArray(value);
}

function isManifestEntry(value: unknown): value is ManifestEntry {
  return (
    isRecord(value) &&
    typeof value.path === 'string' &&
    typeof value.bytes === 'number' &&
    typeof value.sha256 === 'string'
  );
}

function fault(file: string, code: string, message: string): InputFaults {
  const one: Fault = { file, code, message };
  return new InputFaults([one]);
}
