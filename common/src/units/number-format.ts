/** How the numbers of one column are written; decided once, with the reason. */
export interface NumberFormat {
  decimalSign: '.' | ',';
  thousands: '' | '.' | ',' | ' ' | "'";
  /** true: texts such as "1,234" could be read in two ways and nothing decides; they are not read at all */
  undecided: boolean;
  reason: string;
}

export const DECIMAL_POINT: NumberFormat = {
  decimalSign: '.',
  thousands: '',
  undecided: false,
  reason: 'no decimal comma',
};

/** Counts of telling and untelling numbers of a column. */
export interface NumberEvidence {
  point: number;
  comma: number;
  pointThousands: number;
  commaThousands: number;
  openPoint: number;
  openComma: number;
  other: '' | ' ' | "'";
}

const SIMPLE = /^-?(\d+)(?:([.,])(\d+))?$/;
const NUMERIC = /^[<≤±~]?\s*[+-]?[\d.,' ]*\d[\d.,' ]*(?:[eE][+-]?\d+)?/u;

/**
 * Decides decimal and thousands sign of a column from all its texts together.
 * Evidence: both signs in one number (the last is decimal), a sign repeated (thousands), a sign not followed by
 * exactly three digits or preceded by more than three or by a lone 0 (decimal). "1,234" alone is no evidence.
 *
 * @param texts cells as typed, numbers and others
 * @param fileHint what the other columns of the same file decided; used only where the column is silent
 */
export function decideNumberFormat(texts: Iterable<string>, fileHint?: '.' | ','): NumberFormat {
  return formatOf(numberEvidence(texts), fileHint);
}

/** The decision from evidence gathered before, so that long columns are read once. */
export function formatOf(evidence: NumberEvidence, fileHint?: '.' | ','): NumberFormat {
  const { point, comma, pointThousands, commaThousands, openPoint, openComma, other } = evidence;
  const forComma = comma + pointThousands;
  const forPoint = point + commaThousands;
  if (forComma > 0 && forPoint > 0) {
    return {
      decimalSign: forComma > forPoint ? ',' : '.',
      thousands: other,
      undecided: true,
      reason: 'the column mixes decimal points and commas',
    };
  }
  if (forComma > 0)
    return {
      decimalSign: ',',
      thousands: pointThousands + openPoint > 0 ? '.' : other,
      undecided: false,
      reason: 'its numbers show a decimal comma',
    };
  if (forPoint > 0)
    return {
      decimalSign: '.',
      thousands: commaThousands + openComma > 0 ? ',' : other,
      undecided: false,
      reason: 'its numbers show a decimal point',
    };
  return silent(openPoint, openComma, other, fileHint);
}

/** Only texts like "1.234" or "1,234", or none with a sign at all. */
function silent(
  openPoint: number,
  openComma: number,
  other: NumberEvidence['other'],
  hint?: '.' | ',',
): NumberFormat {
  if (openPoint === 0 && openComma === 0)
    return { ...DECIMAL_POINT, decimalSign: hint ?? '.', thousands: other, reason: 'no sign occurs' };
  if (hint) {
    const thousands = hint === ',' ? (openPoint > 0 ? '.' : other) : openComma > 0 ? ',' : other;
    return {
      decimalSign: hint,
      thousands,
      undecided: false,
      reason: `the other columns of the file show a decimal ${hint === ',' ? 'comma' : 'point'}`,
    };
  }
  if (openComma > 0)
    return {
      decimalSign: '.',
      thousands: ',',
      undecided: true,
      reason: 'a comma before three digits may be decimal or thousands',
    };
  return {
    decimalSign: '.',
    thousands: other,
    undecided: false,
    reason: 'points only, and nothing in the file shows a decimal comma',
  };
}

export function numberEvidence(texts: Iterable<string>): NumberEvidence {
  const seen: NumberEvidence = {
    point: 0,
    comma: 0,
    pointThousands: 0,
    commaThousands: 0,
    openPoint: 0,
    openComma: 0,
    other: '',
  };
  for (const text of texts) {
    if (weighSimple(text, seen)) continue;
    const found = NUMERIC.exec(
      text
        .trim()
        .replace(/[\u00a0\u202f\u2009]/gu, ' ')
        .replace(/[’]/gu, "'")
        .replace(/[−–]/gu, '-'),
    );
    if (found)
      weigh(
        found[0]
          .replace(/^[<≤±~+\-\s]+/u, '')
          .replace(/[eE].*$/, '')
          .trim(),
        seen,
      );
  }
  return seen;
}

/** The common case, without the work of the general one: digits with at most one sign. */
function weighSimple(text: string, seen: NumberEvidence): boolean {
  const found = SIMPLE.exec(text);
  if (!found) return false;
  const [, whole = '', sign, fraction = ''] = found;
  if (sign === undefined) return true;
  const open = fraction.length === 3 && whole.length <= 3 && whole !== '0';
  if (sign === '.') seen[open ? 'openPoint' : 'point'] += 1;
  else seen[open ? 'openComma' : 'comma'] += 1;
  return true;
}

function weigh(digits: string, seen: NumberEvidence): void {
  const space = /\d([ '])\d{3}(?!\d)/.exec(digits);
  if (space) seen.other = space[1] as ' ' | "'";
  const points = digits.split('.').length - 1;
  const commas = digits.split(',').length - 1;
  if (points === 0 && commas === 0) return;
  if (points > 0 && commas > 0) {
    const pointLast = digits.lastIndexOf('.') > digits.lastIndexOf(',');
    seen[pointLast ? 'point' : 'comma'] += 1;
    seen[pointLast ? 'commaThousands' : 'pointThousands'] += 1;
  } else if (points + commas > 1) {
    if (points > 1) seen.pointThousands += 1;
    else seen.commaThousands += 1;
  } else {
    const open = /^(?!0[.,])\d{1,3}[.,]\d{3}$/.test(digits);
    if (points > 0) seen[open ? 'openPoint' : 'point'] += 1;
    else seen[open ? 'openComma' : 'comma'] += 1;
  }
}
