/** First letters of the first and the last word of a name: enough to tell colleagues apart in a table. */
export function initialsOf(name: string): string {
  const words = name.split(/[^\p{L}\p{N}]+/u).filter((word) => word !== '');
  const first = words[0] ?? '?';
  const last = words.length > 1 ? words[words.length - 1]! : '';
  return `${[...first][0] ?? ''}${[...last][0] ?? ''}`.toUpperCase().slice(0, 4);
}
