import type { EstimateInputs } from '../src/estimate/estimate-inputs';
import { coarseBaseField } from '../src/fields/base-field';
import { ar6Regions } from '../src/sphere/region-set';
import { ZONAL_BACKDROP } from '../src/tables/zonal-backdrop';

/** A made-up last glacial estimate: one ratio of three everywhere but in East Asia, orbits of PMIP4. */
export function exampleEstimate(change: Partial<EstimateInputs> = {}): EstimateInputs {
  const everywhere = { lnRatio: Math.log(3), sharedLoad: 1, ownSe: 0.4 };
  return {
    slice: {
      name: 'Last Glacial Maximum',
      orbit: { eccentricity: 0.018994, obliquityDeg: 22.949, perihelionLongitudeDeg: 114.42 },
      solarConstantWm2: 1361,
    },
    reference: {
      name: 'pre-industrial',
      orbit: { eccentricity: 0.016764, obliquityDeg: 23.459, perihelionLongitudeDeg: 100.33 },
      solarConstantWm2: 1361,
    },
    field: {
      base: coarseBaseField(),
      regions: ar6Regions().map(({ code }) =>
        code === 'EAS'
          ? {
              code,
              lnRatio: Math.log(4),
              sharedLoad: 0,
              ownSe: 0.1,
              siteCount: 4,
              status: 'sites',
              hatched: false,
            }
          : { code, ...everywhere, siteCount: 0, status: 'global', hatched: true },
      ),
      global: everywhere,
      sharedSe: 0.2,
    },
    optics: { singleScatteringAlbedo: 0.9, asymmetry: 0.7, massExtinctionM2PerG: 0.6 },
    backdrop: ZONAL_BACKDROP.map(({ latitudeSouthDeg, latitudeNorthDeg, ...band }) => ({
      southDeg: latitudeSouthDeg,
      northDeg: latitudeNorthDeg,
      ...band,
    })),
    transmittance: 0.76,
    method: 'thin-layer-daily',
    shortwaveEfficiency: { efficiencyWm2: -13, sky: 'all' },
    longwave: { efficiencyWm2: 8, sky: 'all' },
    ensemble: {
      members: 128,
      seed: 20260101,
      varyRatios: true,
      parameters: [
        {
          name: 'singleScatteringAlbedo',
          distribution: { kind: 'beta', low: 0.85, high: 0.95, alpha: 3, beta: 3 },
          unit: '1',
          source: 'made up',
        },
        {
          name: 'asymmetry',
          distribution: { kind: 'triangular', low: 0.65, mode: 0.7, high: 0.76 },
          unit: '1',
          source: 'made up',
        },
      ],
    },
    ...change,
  };
}
