/** What a person typed as a number: comma or point as decimal sign, true minus or hyphen. */
export type NumberText = { value: number } | { fault: string };

const plain = /^[+-]?(\d+(\.\d*)?|\.\d+)(e[+-]?\d+)?$/i;

/** Reads a typed number; text that could be read in two ways is refused with the two readings named. */
export function readNumberText(text: string): NumberText {
  const tidy = text
    .trim()
    .replace(/^\u2212/, '-')
    .replace(/[\u00a0\u2009 ]/g, '');
  if (tidy === '') return { fault: 'Enter a number.' };
  if (/^[+-]?\d{1,3},\d{3}$/.test(tidy)) {
    return {
      fault: `${text} may mean ${tidy.replace(',', '')} or ${tidy.replace(',', '.')}: write it with a point or without the comma.`,
    };
  }
  const point = tidy.includes('.') ? tidy : tidy.replace(',', '.');
  if (!plain.test(point)) return { fault: `${text} is not a number. Write it as 0.42 or 0,42.` };
  return { value: Number(point) };
}
