import type { ReactNode } from 'react';
import { Figure } from '../../shared/figure/figure';
import { LogChart } from './log-chart';
import { REFERENCE_UM, type Quantity, type SpectrumPoint } from './optics-curves';
import { spectrumOf, type ShownSet } from './shown-set';

type Props = {
  sets: readonly ShownSet[];
  quantity: Quantity;
  title: string;
  sub: ReactNode;
  unit: string;
  yDomain?: [number, number];
};

type Row = { wavelengthUm: number; set: string; low: number; central: number; high: number };

/** One spectrum of the sets shown: lines with their range, marks where only single values are known. */
export function SpectrumFigure({ sets, quantity, title, sub, unit, yDomain }: Props) {
  const series = sets.map((set) => {
    const spectrum = spectrumOf(set);
    return {
      name: set.title,
      colour: set.colour,
      bold: set === sets[0],
      mark: set.curves === undefined && spectrum.length < 2,
      dash: set === sets[0] ? undefined : '5 3',
      points: spectrum.map((point) => pointOf(point, quantity, set === sets[0])),
    };
  });
  const rows = sets.flatMap((set) =>
    spectrumOf(set).map((point): Row => ({
      wavelengthUm: point.wavelengthUm,
      set: set.title,
      ...point[quantity],
    })),
  );
  const number = (id: 'low' | 'central' | 'high', header: string) => ({
    id,
    header,
    unit,
    value: (row: Row) => Number(row[id].toPrecision(4)),
    align: 'right' as const,
  });
  return (
    <Figure<Row>
      title={title}
      sub={sub}
      summary={`${title} over wavelength, with its range, for ${sets.map((set) => set.title).join(', ')}.`}
      table={{
        rows,
        rowKey: (row) => `${row.set} ${row.wavelengthUm}`,
        columns: [
          {
            id: 'wavelength',
            header: 'Wavelength',
            unit: 'µm',
            value: (row) => row.wavelengthUm,
            align: 'right',
          },
          ...(sets.length > 1 ? [{ id: 'set', header: 'Set', value: (row: Row) => row.set }] : []),
          number('low', 'Low'),
          number('central', 'Middle'),
          number('high', 'High'),
        ],
      }}
    >
      <LogChart
        heightPx={182}
        label={`${title} over wavelength`}
        series={series}
        xDomain={[0.3, 15]}
        xTicks={[0.3, 0.55, 1, 3, 10]}
        yDomain={yDomain}
        dashedAt={{ x: REFERENCE_UM }}
      />
    </Figure>
  );
}

const pointOf = (point: SpectrumPoint, quantity: Quantity, withRange: boolean) => {
  const { low, central, high } = point[quantity];
  return { x: point.wavelengthUm, y: central, ...(withRange && { low, high }) };
};
