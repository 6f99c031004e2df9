import { digitGroups, formatNumber, scientificParts } from './format';

type Props = { value: number | null | undefined; decimals?: number; figures?: number; signed?: boolean };

/** A number with narrow gaps between its groups of digits (a margin: Lato has no thin space). */
export function Digits({ value, decimals: wanted, figures, signed }: Props) {
  if (value === null || value === undefined) return <span className="sl-muted">–</span>;
  const decimals = wanted ?? (figures === undefined && Number.isInteger(value) ? 0 : undefined);
  const scientific = decimals === undefined ? scientificParts(value, figures) : null;
  if (scientific) {
    return (
      <span className="sl-unit">
        {scientific.mantissa}
        {' × 10'}
        <sup>{formatNumber(scientific.exponent, { decimals: 0 })}</sup>
      </span>
    );
  }
  const groups = digitGroups(formatNumber(value, { decimals, figures, signed }));
  if (groups.length === 1) return <span className="sl-unit">{groups[0]}</span>;
  return (
    <span className="sl-unit sl-digits">
      {groups.map((group, at) => (
        <span key={at}>{group}</span>
      ))}
    </span>
  );
}
