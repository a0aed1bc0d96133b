// Results and manifests as JSON text: two spaces of indent, a line break at the end, numbers that read back exactly.

/**
 * JSON text of a value.
 * @throws Error where a number is not finite: JSON would write null, and a number would be lost unseen
 */
export function jsonText(value: unknown): string {
  const text = JSON.stringify(
    value,
    (key, inner: unknown) => {
      if (typeof inner === 'number' && !Number.isFinite(inner)) {
        throw new Error(`${key} is ${inner}, which JSON cannot hold`);
      }
      return inner;
    },
    2,
  );
  return `${text}\n`;
}
