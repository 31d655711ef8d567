/** A text for `ilike` with its signs `%`, `_` and `\` meaning themselves. */
export function escapeLike(text: string): string {
  return text.replaceAll(/[\\%_]/g, (sign) => `\\${sign}`);
}
