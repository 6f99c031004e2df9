import { Figure } from '../../shared/figure/figure';
import { formatNumber } from '../../shared/number/format';
import { Unit } from '../../shared/number/unit';
import '../../shared/table/table.css';
import type { Band, Quantity } from './optics-curves';

const rows: readonly { quantity: Quantity; name: string; unit?: string; decimals: number }[] = [
  { quantity: 'massExtinctionM2PerG', name: 'Mass extinction efficiency', unit: 'm2 g-1', decimals: 3 },
  { quantity: 'singleScatteringAlbedo', name: 'Single-scattering albedo', decimals: 3 },
  { quantity: 'asymmetry', name: 'Asymmetry parameter', decimals: 3 },
];
const value = (band: Band, quantity: Quantity) => Number(band[quantity].toPrecision(4));

/** Band means as models take them. */
export function BandsFigure({ bands }: { bands: readonly Band[] }) {
  return (
    <Figure<Band>
      title="Bands"
      sub="weighted by a black body: 5772 K below 4 µm, 288 K above"
      table={{
        rows: bands,
        rowKey: (band) => band.name,
        columns: [
          { id: 'band', header: 'Band', unit: 'µm', value: (band) => band.name },
          { id: 'temperature', header: 'Weighted by', unit: 'K', value: (band) => band.temperatureK },
          ...rows.map(({ quantity, name, unit }) => ({
            id: quantity,
            header: name,
            unit,
            value: (band: Band) => value(band, quantity),
          })),
        ],
      }}
      note="Shortwave: 0.2 to 4 µm. For thin layers; no gas absorbs in these means."
    >
      <div className="optics-scroll" tabIndex={0} role="region" aria-label="Band means">
        <table className="sl-table" aria-label="Band means">
          <thead>
            <tr>
              <th scope="col">Band, µm</th>
              {bands.map((band) => (
                <th key={band.name} scope="col" className="right">
                  {band.name}
                </th>
              ))}
            </tr>
          </thead>
          <tbody>
            {rows.map(({ quantity, name, unit, decimals }) => (
              <tr key={quantity}>
                <th scope="row">
                  {name}
                  {unit && (
                    <>
                      , <Unit of={unit} />
                    </>
                  )}
                </th>
                {bands.map((band) => (
                  <td key={band.name} className="right">
                    {formatNumber(band[quantity], { decimals })}
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
