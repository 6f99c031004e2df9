import { Fragment } from 'react';

/**
 * A unit as it is typeset: `W m-2` becomes W m with a raised −2. Lato lacks the superscript minus, hence `<sup>`.
 * Takes UDUNITS-like text: words parted by spaces, exponents behind the word or after `^`.
 */
export function Unit({ of }: { of: string }) {
  return (
    <span className="sl-unit">
      {of.split(' ').map((word, at) => (
        <Fragment key={at}>
          {at > 0 && '\u00a0'}
          <UnitWord word={word} />
        </Fragment>
      ))}
    </span>
  );
}

function UnitWord({ word }: { word: string }) {
  const parts = /^([^\d^\u2212-]+)\^?([-\u2212]?\d+)$/.exec(word);
  if (!parts) return <>{word.replace(/^u(?=[gm])/, 'µ')}</>;
  return (
    <>
      {parts[1]!.replace(/^u(?=[gm])/, 'µ')}
      <sup>{parts[2]!.replace('-', '\u2212')}</sup>
    </>
  );
}

/** The unit of every forcing. */
export const ForcingUnit = () => <Unit of="W m-2" />;
