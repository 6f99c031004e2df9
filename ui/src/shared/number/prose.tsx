import { Fragment } from 'react';

const RAISED_MINUS = 0x207b;
const RAISED_ZERO = 0x2070;
/** One, two and three stand apart from the other raised digits. */
const RAISED_EARLY = new Map([
  [0xb9, '1'],
  [0xb2, '2'],
  [0xb3, '3'],
]);
const exponent = /(\u207b[\u00b9\u00b2\u00b3\u2070\u2074-\u2079]+)/;

const plain = (text: string) => [...text].map((sign) => plainSign(sign.charCodeAt(0))).join('');

const plainSign = (code: number) =>
  code === RAISED_MINUS ? '\u2212' : (RAISED_EARLY.get(code) ?? String(code - RAISED_ZERO));

/** A sentence of the service whose exponents are set with `<sup>`: the shipped face has no raised minus. */
export const Prose = ({ text }: { text: string }) => (
  <>
    {text.split(exponent).map((part, at) => (
      <Fragment key={at}>{exponent.test(part) ? <sup>{plain(part)}</sup> : part}</Fragment>
    ))}
  </>
);
