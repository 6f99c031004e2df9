import { Tab, TabList } from '@fluentui/react-components';
import { useState } from 'react';
import { Figure } from '../../shared/figure/figure';
import { LogChart, type LogSeries } from './log-chart';
import { sizeCurve, type SizeMeasure, type SizePoint } from './optics-curves';
import type { ShownSet } from './shown-set';

const measures: readonly SizeMeasure[] = ['number', 'surface', 'volume'];

/** Size distribution of the set at work with its modes, and of those beside it as a whole. */
export function SizeFigure({ sets }: { sets: readonly ShownSet[] }) {
  const [measure, setMeasure] = useState<SizeMeasure>('volume');
  const curves = sets.flatMap((set) =>
    set.definition ? [{ set, points: sizeCurve(set.definition, measure) }] : [],
  );
  const own = curves.find(({ set }) => set === sets[0]);
  const modes = own?.set.definition?.modes ?? [];
  const parts: LogSeries[] =
    own && modes.length > 1
      ? modes.map((mode, at) => ({
          name: mode.name,
          colour: at + 1,
          filled: true,
          points: cut(own.points.map((point) => ({ x: point.radiusUm, y: point.modes[at]! }))),
        }))
      : [];
  const wholes = curves.map(({ set, points }): LogSeries => ({
    name: set === sets[0] ? 'all' : set.title,
    colour: set.colour,
    bold: set === sets[0],
    dash: set === sets[0] ? undefined : '5 3',
    filled: set === sets[0] && modes.length < 2,
    points: cut(points.map((point) => ({ x: point.radiusUm, y: point.all }))),
  }));
  return (
    <Figure<SizePoint>
      title="Size distribution"
      sub={`share of ${measure} per unit of ln radius; axis: radius in µm`}
      summary={`Share of ${measure} per unit of the logarithm of radius, for ${sets.map((set) => set.title).join(', ')}.`}
      controls={
        <TabList
          size="small"
          selectedValue={measure}
          aria-label="Size distribution by"
          onTabSelect={(_, data) => setMeasure(data.value as SizeMeasure)}
        >
          {measures.map((one) => (
            <Tab key={one} value={one}>{`By ${one}`}</Tab>
          ))}
        </TabList>
      }
      table={{
        rows: own?.points ?? [],
        rowKey: (row) => String(row.radiusUm),
        columns: [
          { id: 'radius', header: 'Radius', unit: 'µm', value: (row) => round(row.radiusUm), align: 'right' },
          { id: 'all', header: 'All', unit: 'per ln r', value: (row) => round(row.all), align: 'right' },
          ...modes.map((mode, at) => ({
            id: `mode-${at}`,
            header: mode.name,
            unit: 'per ln r',
            value: (row: SizePoint) => round(row.modes[at] ?? 0),
            align: 'right' as const,
          })),
        ],
      }}
    >
      <LogChart
        heightPx={330}
        label={`Share of ${measure} over radius`}
        series={[...wholes, ...parts]}
        dashedAt={{ x: 10, text: '20 µm diameter' }}
      />
    </Figure>
  );
}

/** Limits cut a distribution: its curve falls to the axis there. */
const cut = (points: { x: number; y: number }[]) => [
  { x: points[0]!.x, y: 0 },
  ...points,
  { x: points.at(-1)!.x, y: 0 },
];

const round = (value: number) => Number(value.toPrecision(4));
