import type { EstimateResult } from '@siltlight/common/wire/estimates';
import type { Interval } from '@siltlight/common/wire/shared';
import { Figure } from '../../shared/figure/figure';
import { Amount } from '../../shared/number/amount';
import { formatNumber } from '../../shared/number/format';
import { ForcingUnit, Unit } from '../../shared/number/unit';
import '../../shared/table/table.css';

type Triple = { shortwaveWm2: Interval | null; longwaveWm2: Interval | null; netWm2: Interval | null };

/** Kinds and skies beside each other, each under its own name, so that none is taken for another. */
export function KindsTable({ result }: { result: EstimateResult }) {
  const { global, label } = result;
  const rows: [string, Triple][] = [
    ['Forcing, all sky', global.forcing],
    ['Forcing, clear sky', global.forcingClearSky],
    [`Direct effect, ${label.sliceName}, all sky`, global.directEffect],
    [`Direct effect, ${label.referenceName}, all sky`, global.directEffectReference],
  ];
  return (
    <Figure
      plain
      title="By kind and sky"
      sub={
        <>
          global, <ForcingUnit />, 5–95 %
        </>
      }
      note={
        <>
          Forcing = slice minus reference. Direct effect = with this dust minus without any: another kind.
          Dust in the air: {formatNumber(global.burdenSliceTg, { figures: 2 })} <Unit of="Tg" /> against{' '}
          {formatNumber(global.burdenReferenceTg, { figures: 2 })} <Unit of="Tg" />.
        </>
      }
    >
      <div className="fold-scroll" tabIndex={0} role="region" aria-label="Forcing by kind and sky">
        <table className="sl-table kinds">
          <thead>
            <tr>
              <th scope="col">Kind</th>
              <th scope="col" className="right">
                SW
              </th>
              <th scope="col" className="right">
                LW
              </th>
              <th scope="col" className="right">
                Net
              </th>
            </tr>
          </thead>
          <tbody>
            {rows.map(([name, triple]) => (
              <tr key={name}>
                <td>{name}</td>
                {[triple.shortwaveWm2, triple.longwaveWm2, triple.netWm2].map((amount, at) => (
                  <td key={at} className="right kinds-amount">
                    <Amount of={amount} bare />
                  </td>
                ))}
              </tr>
            ))}
          </tbody>
        </table>
      </div>
    </Figure>
  );
}
