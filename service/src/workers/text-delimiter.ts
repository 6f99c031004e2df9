import { stat } from 'node:fs/promises';
import type { TextEncoding } from './reader-messages';
import { decoderOf, leadingBytes, sniffedBytes, unixLines } from './text-encoding';

export const anyBlank = 'whitespace';
export const twoBlanks = 'two or more spaces';

/** In the order in which a tie is decided: a comma may be a decimal sign, a tab hardly anything else. */
const separators = ['\t', ';', '|', ','];

/** Lines from the start and from the middle: a long preface must not decide for the table below it. */
export async function sampleLines(path: string, encoding: TextEncoding): Promise<string[]> {
  const { size } = await stat(path);
  const start = linesOf(await leadingBytes(path), encoding);
  if (size <= sniffedBytes) return start.filter((line) => line.trim() !== '');
  const middle = Math.floor(Math.max(sniffedBytes, size / 2) / 2) * 2;
  // The first and last lines of a piece from the middle are cut.
  const later = linesOf(await leadingBytes(path, sniffedBytes, middle), encoding).slice(1, -1);
  return [...start.slice(0, -1), ...later].filter((line) => line.trim() !== '');
}

const linesOf = (bytes: Buffer, encoding: TextEncoding): string[] =>
  unixLines(decoderOf(encoding)(bytes)).split('\n');

/** The separator under which most lines have the same number of fields; null when none cuts the lines. */
export function decideDelimiter(lines: string[]): string | null {
  const named = /^"?sep=(.)"?$/.exec(lines[0]?.trim() ?? '')?.[1];
  if (named !== undefined) return named;
  const unquoted = lines.map((line) => line.replace(/"[^"]*"/g, ''));
  const single = best(separators, unquoted, (line, mark) => line.split(mark).length - 1);
  if (single.agreeing >= lines.length * 0.5) return single.mark;
  const blanks: Record<string, RegExp> = { [twoBlanks]: /\s{2,}/g, [anyBlank]: /\s+/g };
  const aligned = best(
    [twoBlanks, anyBlank],
    unquoted,
    (line, mark) => line.trim().match(blanks[mark]!)?.length ?? 0,
    0.9,
  );
  if (aligned.agreeing > single.agreeing) return aligned.mark;
  return single.agreeing > 0 ? single.mark : null;
}

interface Agreement {
  mark: string;
  agreeing: number;
}

/** An earlier mark keeps its place unless a later one does better by more than `favour` allows. */
function best(
  marks: string[],
  lines: string[],
  countIn: (line: string, mark: string) => number,
  favour = 1,
): Agreement {
  let found: Agreement = { mark: marks[0]!, agreeing: 0 };
  for (const mark of marks) {
    const agreeing = linesThatAgree(lines.map((line) => countIn(line, mark)));
    if (agreeing * favour > found.agreeing) found = { mark, agreeing };
  }
  return found;
}

function linesThatAgree(counts: number[]): number {
  const lines = new Map<number, number>();
  for (const count of counts) if (count > 0) lines.set(count, (lines.get(count) ?? 0) + 1);
  return Math.max(0, ...lines.values());
}

const spoken: Record<string, string> = { '\t': 'tab', ';': 'semicolon', '|': 'vertical bar', ',': 'comma' };

export const delimiterInWords = (delimiter: string): string => spoken[delimiter] ?? delimiter;
