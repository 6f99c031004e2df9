import type { FieldDetail } from '@siltlight/common/wire/slices';
import { useQuery } from '@tanstack/react-query';
import { useMemo } from 'react';
import { ErrorState } from '../../shared/feedback/error-state';
import { LoadingFigure } from '../../shared/feedback/loading';
import { Figure } from '../../shared/figure/figure';
import { ForcingMap, mapPicture } from '../../shared/map/forcing-map';
import type { MapData } from '../../shared/map/map-data';
import { regionsQuery } from '../../shared/map/regions-query';
import { sliceWithin } from '../../shared/page/slice-name';
import { usedSites } from './field-words';

type Props = {
  field: FieldDetail;
  selected: string | null;
  hovered: string | null;
  onSelect: (code: string | null) => void;
  onHover: (code: string | null) => void;
};

/** Ends of the logarithmic colours: the range of the ratios, rounded outwards to a step of 1, 2, 5. */
function rampEnds(ratios: readonly number[]): { limit: number; floor: number } {
  const steps = [0.05, 0.1, 0.2, 0.5, 1, 2, 5, 10, 20, 50, 100, 200];
  const low = Math.min(1, ...ratios);
  const high = Math.max(2, ...ratios);
  return {
    floor: [...steps].reverse().find((step) => step <= low) ?? 0.05,
    limit: steps.find((step) => step >= high) ?? 200,
  };
}

/** Ratio of the slice to its reference by region, with the sites it rests on. */
export function FieldMap({ field, selected, hovered, onSelect, onHover }: Props) {
  const regions = useQuery(regionsQuery);
  const data = useMemo<MapData>(
    () => ({
      regions: regions.data ?? [],
      values: Object.fromEntries(field.regions.map((region) => [region.code, region.ratio.value])),
      ramp: 'flux',
      ...rampEnds(field.regions.map((region) => region.ratio.value)),
      hatched: new Set(field.regions.filter((region) => region.hatched).map((region) => region.code)),
      sites: usedSites(field.sites).map((site) => ({
        longitudeDeg: site.longitudeDeg,
        latitudeDeg: site.latitudeDeg,
        sampleCount: Math.max(1, site.sliceSamples + site.referenceSamples),
        name: site.site,
      })),
      selected,
      hovered,
    }),
    [regions.data, field, selected, hovered],
  );
  return (
    <Figure
      title="Dust ratio by region"
      sub={`${field.sliceName} over ${sliceWithin(field.referenceName)}`}
      picture={mapPicture(data)}
    >
      {regions.isError && <ErrorState error={regions.error} retry={() => void regions.refetch()} />}
      {regions.data ? (
        <ForcingMap
          {...data}
          label={`Ratio of dust in ${field.sliceName} to ${field.referenceName} by region`}
          unit="times"
          hatchMeans="fewer than 3 sites, or the interval holds 1"
          onSelect={onSelect}
          onHover={onHover}
        />
      ) : (
        !regions.isError && <LoadingFigure height={320} />
      )}
    </Figure>
  );
}
