import { ExplainedCautions } from '../../shared/feedback/explained-cautions';
import { Figure } from '../../shared/figure/figure';
import { LogChart } from './log-chart';
import type { ShownSet } from './shown-set';

type Row = { set: string; humidityPercent: number; ratio: number };

const NEAR_SATURATION = {
  code: 'humidity-near-saturation',
  message: 'Above 90 % relative humidity the curve rises steeply and the growth by κ is least certain.',
};

/** f(RH) of the sets that take up water; nothing where none does. */
export function HumidityFigure({ sets }: { sets: readonly ShownSet[] }) {
  const wet = sets.filter((set) => (set.curves?.humidity.length ?? 0) > 0);
  if (wet.length === 0) return null;
  const names = wet.map((set) => set.title).join(', ');
  const rows = wet.flatMap((set) =>
    set.curves!.humidity.map(({ relativeHumidity, ratio }): Row => ({
      set: set.title,
      humidityPercent: Number((100 * relativeHumidity).toPrecision(4)),
      ratio: Number(ratio.toPrecision(4)),
    })),
  );
  return (
    <Figure<Row>
      title="Extinction with humidity, f(RH)"
      sub="relative to dry at 0.55 µm, no unit"
      summary={`Extinction at 0.55 µm relative to dry over relative humidity of 0 to 95 % for ${names}.`}
      table={{
        rows,
        rowKey: (row) => `${row.set} ${row.humidityPercent}`,
        columns: [
          {
            id: 'humidity',
            header: 'Relative humidity',
            unit: '%',
            value: (row) => row.humidityPercent,
            align: 'right',
          },
          ...(wet.length > 1 ? [{ id: 'set', header: 'Set', value: (row: Row) => row.set }] : []),
          { id: 'ratio', header: 'Extinction relative to dry', value: (row) => row.ratio, align: 'right' },
        ],
      }}
      note="Axis: relative humidity in %. Growth by κ without curvature (Petters & Kreidenweis 2007), water mixed in by volume; a factor for shape cancels."
    >
      <LogChart
        heightPx={182}
        linearX
        label="Extinction relative to dry over relative humidity"
        series={wet.map((set) => ({
          name: set.title,
          colour: set.colour,
          bold: set === sets[0],
          dash: set === sets[0] ? undefined : '5 3',
          points: set.curves!.humidity.map(({ relativeHumidity, ratio }) => ({
            x: 100 * relativeHumidity,
            y: ratio,
          })),
        }))}
        xDomain={[0, 95]}
        xTicks={[0, 20, 40, 60, 80, 90]}
        dashedAt={{ x: 90 }}
      />
      <ExplainedCautions of={[NEAR_SATURATION]} label="Cautions on humidity" />
    </Figure>
  );
}
