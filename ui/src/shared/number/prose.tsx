import { Fragment } from 'react';

const raised: Record<string, string> = { '\u207b': '\u2212', '\u00b9': '1', '\u00b2': '2', '\u00b3': '3' };
const exponent = /(\u207b[\u00b9\u00b2\u00b3\u2070\u2074-\u2079]+)/;

const plain = (text: string) =>
  [...text].map((sign) => raised[sign] ?? String.fromCharCode(sign.charCodeAt(0) - 0x2070 + 48)).join('');

/** A sentence of the service whose exponents are set with `<sup>`: the shipped face has no raised minus. */
export const Prose = ({ text }: { text: string }) => (
  <>
    {text.split(exponent).map((part, at) => (
      <Fragment key={at}>{exponent.test(part) ? <sup>{plain(part)}</sup> : part}</Fragment>
    ))}
  </>
);
