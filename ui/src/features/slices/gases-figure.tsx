import type { SliceContent } from '@siltlight/common/wire/slices';
import type { ReactNode } from 'react';
import { Figure } from '../../shared/figure/figure';
import { formatNumber } from '../../shared/number/format';
import { ForcingUnit } from '../../shared/number/unit';
import '../../shared/table/table.css';
import { orbitalAgeText } from './slice-words';

const rows: {
  name: string;
  head: ReactNode;
  decimals: number;
  of: (slice: SliceContent) => number | null;
}[] = [
  {
    name: 'co2',
    head: (
      <>
        CO<sub>2</sub>, ppm
      </>
    ),
    decimals: 1,
    of: (slice) => slice.gases?.co2Ppm ?? null,
  },
  {
    name: 'ch4',
    head: (
      <>
        CH<sub>4</sub>, ppb
      </>
    ),
    decimals: 1,
    of: (slice) => slice.gases?.ch4Ppb ?? null,
  },
  {
    name: 'n2o',
    head: (
      <>
        N<sub>2</sub>O, ppb
      </>
    ),
    decimals: 1,
    of: (slice) => slice.gases?.n2oPpb ?? null,
  },
  {
    name: 'sun',
    head: (
      <>
        Solar constant, <ForcingUnit />
      </>
    ),
    decimals: 1,
    of: (slice) => slice.solarConstantWm2,
  },
];

const shown = (value: number | null, decimals: number) =>
  value === null ? <span className="sl-muted">not set</span> : formatNumber(value, { decimals });

/** Greenhouse gases and the strength of the sun, beside those of the reference. */
export function GasesFigure({ slice, reference }: { slice: SliceContent; reference: SliceContent | null }) {
  const sources = [...new Set([slice.gases?.source, reference?.gases?.source].filter(Boolean))];
  return (
    <Figure
      plain
      title="Gases and sun"
      note={sources.length > 0 ? `Gases: ${sources.join('; ')}.` : 'No gases are set for this slice.'}
    >
      <table className="sl-table">
        <thead>
          <tr>
            <th scope="col">Quantity</th>
            <th scope="col" className="right">
              {orbitalAgeText(slice)}
            </th>
            {reference && (
              <th scope="col" className="right">
                {orbitalAgeText(reference)}
              </th>
            )}
          </tr>
        </thead>
        <tbody>
          {rows.map(({ name, head, decimals, of }) => (
            <tr key={name}>
              <td>{head}</td>
              <td className="right">
                <b>{shown(of(slice), decimals)}</b>
              </td>
              {reference && <td className="right">{shown(of(reference), decimals)}</td>}
            </tr>
          ))}
        </tbody>
      </table>
    </Figure>
  );
}
