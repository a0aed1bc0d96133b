// A name for a study kept in this browser that no other study has.

/** Bytes of a name. Reason: as many as a random UUID has, so that two never meet. */
const BYTES = 16;

/** Random, in hexadecimal; `crypto.randomUUID` is not there on a page of a plain http host. */
export function newId(): string {
  return [...crypto.getRandomValues(new Uint8Array(BYTES))]
    .map((byte) => byte.toString(16).padStart(2, '0'))
    .join('');
}
