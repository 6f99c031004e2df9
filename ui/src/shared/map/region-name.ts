/** The AR6 table writes names as S.South-America: as people read them, S. South America. */
export const regionTitle = (name: string) =>
  name
    .replace(/^Equatorial\./, 'Equatorial ')
    .replace(/&/g, ' & ')
    .replace(/\.(?=\S)/g, '. ')
    .replace(/(?<=\w)-(?=[A-Za-z])/g, ' ');

/**
 * A message that starts with region codes ("SAH, ARP: ...") with the names in their place, the first few of them;
 * codes are for files, names for people.
 */
export function withRegionNames(message: string, names: ReadonlyMap<string, string>, most = 3): string {
  const found = /^([A-Z]{2,4}(?:, [A-Z]{2,4})*): /.exec(message);
  const codes = found?.[1]?.split(', ') ?? [];
  if (!found || !codes.every((code) => names.has(code))) return message;
  const rest = codes.length - most;
  const list = codes.slice(0, rest > 1 ? most : codes.length).map((code) => names.get(code));
  return `${list.join(', ')}${rest > 1 ? ` and ${rest} more regions` : ''}: ${message.slice(found[0].length)}`;
}
