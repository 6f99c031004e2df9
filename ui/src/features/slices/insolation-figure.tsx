import type { SliceContent } from '@siltlight/common/wire/slices';
import { useMemo } from 'react';
import { Figure } from '../../shared/figure/figure';
import { useWidth } from '../../shared/figure/use-width';
import { sharedLimit } from '../../shared/map/forcing-map';
import { formatForcing, formatNumber } from '../../shared/number/format';
import { ForcingUnit } from '../../shared/number/unit';
import { sliceWithin } from '../../shared/page/slice-name';
import type { DataColumn } from '../../shared/table/column';
import { useColourMode } from '../../shared/theme/colour-mode';
import { forcingColour, gradient, ramps } from '../../shared/theme/ramps';
import {
  ANOMALY_STEP_DEG,
  insolationAnomaly,
  MONTH_NAMES,
  MONTHS,
  type AnomalyCell,
} from './insolation-anomaly';

const LEFT_PX = 40;
const FOOT_PX = 20;
const HEIGHT_PX = 250;
const LATITUDE_TICKS = [60, 30, 0, -30, -60];

const latitudeText = (latitudeDeg: number) =>
  latitudeDeg === 0 ? '0°' : `${Math.abs(latitudeDeg)}° ${latitudeDeg > 0 ? 'N' : 'S'}`;

const columns: DataColumn<AnomalyCell>[] = [
  { id: 'month', header: 'Month', value: (row) => row.month + 1, cell: (row) => MONTH_NAMES[row.month] },
  { id: 'lat', header: 'Latitude', unit: 'degree', value: (row) => row.latitudeDeg, align: 'right' },
  {
    id: 'anomaly',
    header: 'Anomaly',
    unit: 'W m-2',
    value: (row) => row.anomalyWm2,
    cell: (row) => formatForcing(row.anomalyWm2),
    align: 'right',
  },
];

/** How the sun's light at the top of the air differs from the reference, by latitude and month. */
export function InsolationFigure({ slice, reference }: { slice: SliceContent; reference: SliceContent }) {
  const cells = useMemo(() => insolationAnomaly(slice, reference), [slice, reference]);
  const limit = useMemo(() => sharedLimit(cells.map((cell) => cell.anomalyWm2)), [cells]);
  const { mode } = useColourMode();
  const most = cells.reduce((a, b) => (Math.abs(b.anomalyWm2) > Math.abs(a.anomalyWm2) ? b : a));
  const summary = `Insolation of ${slice.name} minus ${reference.name}: largest at ${latitudeText(Math.round(most.latitudeDeg))} in ${MONTH_NAMES[most.month]}, ${formatNumber(most.anomalyWm2, { decimals: 1, signed: true })} watts per square metre.`;
  return (
    <Figure
      title={`Insolation against ${sliceWithin(reference.name)}`}
      sub={
        <>
          daily mean, <ForcingUnit />
        </>
      }
      summary={summary}
      table={{ columns, rows: cells, rowKey: (row) => `${row.month} ${row.latitudeDeg}` }}
      note="Months of 30° of the sun's course each, from their middle day: equal places on both orbits."
    >
      <Grid cells={cells} limitWm2={limit} label={summary} />
      <div className="insolation-key">
        <div style={{ background: gradient(ramps.forcing[mode]) }} />
        <div>
          {[-1, -0.5, 0, 0.5, 1].map((share) => (
            <span key={share}>{formatNumber(share * limit, { figures: 2, signed: true })}</span>
          ))}
        </div>
      </div>
    </Figure>
  );
}

function Grid({ cells, limitWm2, label }: { cells: AnomalyCell[]; limitWm2: number; label: string }) {
  const [ref, width] = useWidth(414);
  const { mode } = useColourMode();
  const column = (width - LEFT_PX - 4) / 12;
  const plot = HEIGHT_PX - FOOT_PX;
  const y = (latitudeDeg: number) => ((90 - latitudeDeg) / 180) * plot;
  const row = (ANOMALY_STEP_DEG / 180) * plot;
  return (
    <div ref={ref}>
      <svg width={width} height={HEIGHT_PX} role="img" aria-label={label}>
        {cells.map((cell) => (
          <rect
            key={`${cell.month} ${cell.latitudeDeg}`}
            x={LEFT_PX + cell.month * column}
            y={y(cell.latitudeDeg + ANOMALY_STEP_DEG / 2)}
            width={column + 0.4}
            height={row + 0.4}
            style={{ fill: forcingColour(cell.anomalyWm2, limitWm2, mode) }}
          >
            <title>
              {`${MONTH_NAMES[cell.month]}, ${latitudeText(cell.latitudeDeg)}: ${formatNumber(cell.anomalyWm2, { decimals: 1, signed: true })} W/m²`}
            </title>
          </rect>
        ))}
        {LATITUDE_TICKS.map((latitude) => (
          <text key={latitude} x={LEFT_PX - 6} y={y(latitude) + 4} textAnchor="end" className="tick">
            {latitudeText(latitude)}
          </text>
        ))}
        {MONTHS.map((month, at) => (
          <text
            key={MONTH_NAMES[at]}
            x={LEFT_PX + (at + 0.5) * column}
            y={HEIGHT_PX - 5}
            textAnchor="middle"
            className="tick"
          >
            {month}
          </text>
        ))}
      </svg>
    </div>
  );
}
