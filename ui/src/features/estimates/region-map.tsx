import { Tab, TabList } from '@fluentui/react-components';
import type { EstimateRegionResult } from '@siltlight/common/wire/estimates';
import { useQuery } from '@tanstack/react-query';
import { useMemo } from 'react';
import { ErrorState } from '../../shared/feedback/error-state';
import { LoadingFigure } from '../../shared/feedback/loading';
import { Figure } from '../../shared/figure/figure';
import { ForcingMap, mapPicture, sharedLimit } from '../../shared/map/forcing-map';
import type { MapData, MapSite } from '../../shared/map/map-data';
import { regionsQuery } from '../../shared/map/regions-query';
import { ForcingUnit } from '../../shared/number/unit';
import { partNames, partOf, partTitles, type Part } from './result-words';

export type Step = {
  selected: string | null;
  hovered: string | null;
  onSelect: (code: string | null) => void;
  onHover: (code: string | null) => void;
};

type Props = Step & {
  regions: EstimateRegionResult[];
  sites: readonly MapSite[];
  part: Part;
  onPart: (part: Part) => void;
};

const parts = Object.keys(partTitles) as Part[];

/** Forcing by region. SW, LW and net share their limits, so that the three maps can be compared. */
export function RegionMap({ regions, sites, part, onPart, selected, hovered, onSelect, onHover }: Props) {
  const outlines = useQuery(regionsQuery);
  const limit = useMemo(
    () => sharedLimit(regions.flatMap(({ forcing }) => parts.map((one) => partOf(forcing, one).value))),
    [regions],
  );
  const data = useMemo<MapData>(
    () => ({
      regions: outlines.data ?? [],
      values: Object.fromEntries(regions.map(({ code, forcing }) => [code, partOf(forcing, part).value])),
      limit,
      hatched: new Set(regions.filter((region) => region.hatched).map((region) => region.code)),
      sites,
      selected,
      hovered,
    }),
    [outlines.data, regions, part, limit, sites, selected, hovered],
  );
  return (
    <Figure
      title={`${partNames[part]} forcing by region`}
      sub={
        <>
          annual mean, <ForcingUnit />
        </>
      }
      picture={mapPicture(data)}
      controls={
        <TabList
          size="small"
          selectedValue={part}
          onTabSelect={(_, tab) => onPart(tab.value as Part)}
          aria-label="Part of the forcing"
        >
          {parts.map((one) => (
            <Tab key={one} value={one}>
              {partTitles[one]}
            </Tab>
          ))}
        </TabList>
      }
    >
      {outlines.isError && <ErrorState error={outlines.error} retry={() => void outlines.refetch()} />}
      {outlines.data ? (
        <ForcingMap
          {...data}
          label={`${partNames[part]} forcing by region; the table beside it holds the numbers`}
          unit="W/m²"
          onSelect={onSelect}
          onHover={onHover}
        />
      ) : (
        !outlines.isError && <LoadingFigure height={330} />
      )}
    </Figure>
  );
}
