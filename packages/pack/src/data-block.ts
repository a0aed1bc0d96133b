// JSON for a script element that holds data: text that cannot end the element, whatever it contains.

/**
 * Without `<` neither `</script` nor `<!--` can occur, the two sequences that end or change how a script element is
 * read (HTML, 13.2.5.4 and following); in JSON `<` may stand as an escape everywhere that it may stand at all.
 */
export function dataBlock(value: unknown): string {
  return JSON.stringify(value).replaceAll('<', '\\u003c');
}
