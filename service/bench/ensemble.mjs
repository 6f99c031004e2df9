// 1000 members of the half-day thin layer: sums over area once, against every cell for every member.
import { compare, row } from './measure.mjs';
import { runEstimate } from '@siltlight/common/estimate/run-estimate';
import { sliceField } from '@siltlight/common/estimate/slice-field';
import { usualParameters } from '@siltlight/common/estimate/usual-parameters';
import { coarseBaseField } from '@siltlight/common/fields/base-field';
import { ar6Regions } from '@siltlight/common/sphere/region-set';
import { regularGrid } from '@siltlight/common/sphere/regular-grid';
import { ZONAL_BACKDROP } from '@siltlight/common/tables/zonal-backdrop';

const MEMBERS = 1000;
const ratio = { lnRatio: Math.log(3), sharedLoad: 1, ownSe: 0.4 };
const orbit = { eccentricity: 0.018994, obliquityDeg: 22.949, perihelionLongitudeDeg: 114.42 };
const light = { name: 'slice', orbit, solarConstantWm2: 1361 };
const inputs = {
  slice: light,
  reference: { ...light, name: 'reference' },
  field: {
    base: coarseBaseField(),
    regions: ar6Regions().map(({ code }) => ({
      code,
      ...ratio,
      siteCount: 0,
      status: 'global',
      hatched: true,
    })),
    global: ratio,
    sharedSe: 0.2,
  },
  optics: { singleScatteringAlbedo: 0.9, asymmetry: 0.7, massExtinctionM2PerG: 0.6 },
  backdrop: ZONAL_BACKDROP.map(({ latitudeSouthDeg, latitudeNorthDeg, ...band }) => ({
    southDeg: latitudeSouthDeg,
    northDeg: latitudeNorthDeg,
    ...band,
  })),
  transmittance: 0.76,
  method: 'thin-layer',
  longwave: null,
  ensemble: {
    members: MEMBERS,
    seed: 1,
    varyRatios: true,
    parameters: usualParameters({
      optics: {
        singleScatteringAlbedo: { low: 0.85, central: 0.9, high: 0.95 },
        asymmetry: { low: 0.65, central: 0.7, high: 0.76 },
        source: 'bench',
      },
      transmittance: 0.76,
      method: 'thin-layer',
      longwaveEfficiencyWm2: null,
    }),
  },
};

/** First check, then time: the field's area mean is the global mean of the run. */
function agree() {
  const field = sliceField(inputs);
  const { cellAreaFraction, columns } = regularGrid(field.stepDeg);
  const mean = field.netForcingWm2.reduce(
    (sum, value, cell) => sum + value * cellAreaFraction[Math.floor(cell / columns)],
    0,
  );
  const run = runEstimate(inputs).global.forcing.netWm2.value;
  if (Math.abs(mean - run) > 1e-9)
    throw new Error(`The cells give ${mean}, the sums ${run}: nothing was timed.`);
}

export async function ensembleRows() {
  agree();
  const result = await compare(
    `${MEMBERS} members by sums over area, against ${MEMBERS} fields cell by cell (measured on 20, times 50)`,
    () => runEstimate(inputs),
    () => {
      for (let member = 0; member < 20; member++) {
        sliceField({ ...inputs, transmittance: 0.7 + member / 200 });
      }
    },
  );
  return [row({ ...result, b: result.b * 50, ratio: result.ratio / 50 })];
}
