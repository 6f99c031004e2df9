import type { EstimateRegionResult, EstimateResult, ForcingTriple } from '@siltlight/common/wire/estimates';
import { useMemo } from 'react';
import { HatchSign } from '../../shared/map/forcing-map';
import { decimalsOf, rangeText } from '../../shared/number/amount';
import { formatNumber } from '../../shared/number/format';
import type { DataColumn } from '../../shared/table/column';
import { DataTable } from '../../shared/table/data-table';
import { IntervalBar } from './interval-bar';
import type { Step } from './region-map';
import { partOf, partTitles, type Part } from './result-words';

type Row = { code: string; name: string; siteCount: number; hatched: boolean; forcing: ForcingTriple };

function columnsFor(domain: [number, number], part: Part): DataColumn<Row>[] {
  const number = (one: Part, wideOnly: boolean): DataColumn<Row> => ({
    id: one,
    header: partTitles[one],
    unit: 'W m-2',
    value: (row) => partOf(row.forcing, one).value,
    cell: (row) => {
      const amount = partOf(row.forcing, one);
      const text = formatNumber(amount.value, { decimals: decimalsOf(amount), signed: true });
      return one === part ? <b>{text}</b> : text;
    },
    align: 'right',
    wideOnly,
  });
  return [
    {
      id: 'name',
      header: 'Region',
      value: (row) => row.name,
      cell: (row) => (
        <>
          {row.name}
          {row.hatched && <HatchSign />}
        </>
      ),
    },
    number('sw', part !== 'sw'),
    number('lw', part !== 'lw'),
    number('net', part !== 'net'),
    {
      id: 'range',
      header: '5–95 %',
      value: (row) => rangeText(partOf(row.forcing, part)) ?? '',
      cell: (row) => <span className="sl-muted">{rangeText(partOf(row.forcing, part)) ?? '–'}</span>,
      align: 'right',
      sortable: false,
    },
    { id: 'sites', header: 'Sites', value: (row) => row.siteCount, align: 'right' },
    {
      id: 'bar',
      header: 'Interval',
      heading: <span className="sl-hidden">Interval</span>,
      value: () => null,
      cell: (row) => <IntervalBar of={partOf(row.forcing, part)} domain={domain} />,
      sortable: false,
      screenOnly: true,
      wideOnly: true,
    },
  ];
}

type Props = Pick<Step, 'selected' | 'onSelect' | 'onHover'> & {
  result: EstimateResult;
  part: Part;
  usedSites: number;
};

/** Regions and the global mean, in step with the map. */
export function RegionTable({ result, part, usedSites, selected, onSelect, onHover }: Props) {
  const { regions, global, outside } = result;
  const columns = useMemo(() => columnsFor(domainOf(regions, part), part), [regions, part]);
  const pinned = useMemo<Row[]>(() => {
    const total = { code: 'global', name: 'Global mean', siteCount: usedSites, hatched: false };
    return [{ ...total, forcing: global.forcing }];
  }, [global, usedSites]);
  return (
    <DataTable<Row>
      caption={`${regions.length} regions`}
      sub="a row or a region: one follows the other"
      address="regions-"
      columns={columns}
      rows={regions}
      pinned={pinned}
      rowKey={(row) => row.code}
      startSort={part}
      heightPx={356}
      selectedKey={selected}
      onSelect={(row) => onSelect(row.code)}
      onHover={(row) => onHover(row && !pinned.includes(row) ? row.code : null)}
      empty={<p className="sl-13 sl-muted">No region.</p>}
      foot={
        <>
          Slice minus reference, positive warms. <HatchSign /> few sites, or the interval includes zero.
          {outside.areaShare > 0 &&
            ` A gap of ${formatNumber(outside.areaShare * 100, { figures: 2 })} % of the Earth lies in no region; with it the regions add up to the globe.`}
        </>
      }
    />
  );
}

function domainOf(regions: readonly EstimateRegionResult[], part: Part): [number, number] {
  const ends = regions.flatMap(({ forcing }) => {
    const { value, low, high } = partOf(forcing, part);
    return [low ?? value, high ?? value];
  });
  return [Math.min(0, ...ends), Math.max(0, ...ends)];
}
