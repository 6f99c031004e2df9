import { Figure } from '../../shared/figure/figure';
import { useColourMode } from '../../shared/theme/colour-mode';
import { seriesColours } from '../../shared/theme/ramps';
import { LogChart } from './log-chart';
import type { PhasePoint } from './optics-curves';
import { polarPath, polarRings } from './polar-path';
import type { ShownSet } from './shown-set';

type Row = PhasePoint & { set: string };

const phaseOf = (set: ShownSet) => set.curves?.phase ?? [];
const columns = [
  { id: 'angle', header: 'Scattering angle', unit: '°', value: (row: Row) => row.angleDeg, align: 'right' },
  { id: 'set', header: 'Set', value: (row: Row) => row.set },
  {
    id: 'value',
    header: 'Phase function',
    value: (row: Row) => Number(row.value.toPrecision(4)),
    align: 'right',
  },
] as const;

/** The phase function at 0.55 µm twice: over its angle on a logarithmic axis, and round the particle. */
export function PhaseFigures({ sets }: { sets: readonly ShownSet[] }) {
  const drawn = sets.filter((set) => phaseOf(set).length > 0);
  const table = {
    columns,
    rows: drawn.flatMap((set) => phaseOf(set).map((point): Row => ({ ...point, set: set.title }))),
    rowKey: (row: Row) => `${row.set} ${row.angleDeg}`,
  };
  return (
    <>
      <Figure<Row>
        title="Phase function"
        sub="at 0.55 µm; mean over all directions 1; axis: scattering angle in degrees"
        summary="Share of light scattered by each angle, from straight ahead at 0 to straight back at 180 degrees."
        table={table}
      >
        <LogChart
          linearX
          logY
          heightPx={240}
          label="Phase function over scattering angle"
          xDomain={[0, 180]}
          xTicks={[0, 30, 60, 90, 120, 150, 180]}
          series={drawn.map((set) => ({
            name: set.title,
            colour: set.colour,
            bold: set === sets[0],
            dash: set === sets[0] ? undefined : '5 3',
            points: phaseOf(set).map((point) => ({ x: point.angleDeg, y: point.value })),
          }))}
        />
      </Figure>
      <Figure<Row>
        title="Round the particle"
        sub="light comes from the left; rings: powers of ten"
        summary="The same phase function as distance from the particle, on a logarithmic scale."
        table={table}
      >
        <PolarDrawing sets={drawn} />
      </Figure>
    </>
  );
}

const SIZE_PX = 240;

function PolarDrawing({ sets }: { sets: readonly ShownSet[] }) {
  const { mode } = useColourMode();
  const values = sets.flatMap((set) => phaseOf(set).map((point) => point.value));
  if (values.length === 0) return <div className="optics-waiting" style={{ height: SIZE_PX }} />;
  const scale = polarRings(values);
  return (
    <svg
      viewBox="-130 -122 260 244"
      width="100%"
      height={SIZE_PX}
      role="img"
      aria-label="Phase function round the particle"
    >
      {scale.rings.map((ring) => (
        <g key={ring}>
          <circle r={scale.radiusOf(ring)} className="optics-ring" />
          <text x={2} y={-scale.radiusOf(ring) - 2} className="tick">
            {ring}
          </text>
        </g>
      ))}
      <line x1={-126} x2={126} className="optics-ring" />
      {sets.map((set, at) => (
        <path
          key={set.key}
          d={polarPath(phaseOf(set), scale.radiusOf)}
          className="line"
          style={{ stroke: seriesColours[mode][set.colour % 6] }}
          strokeDasharray={at === 0 ? undefined : '5 3'}
        />
      ))}
    </svg>
  );
}
