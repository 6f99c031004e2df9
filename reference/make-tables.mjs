/** Makers of the files of common/src/tables: each answers the TypeScript text of one table. */
import { landCounts } from './land-fraction.mjs';
import { number, numberOrNull, rows, slugOf, textOrNull } from './read-table.mjs';

/** One character per count of land points 0 to 64 of a cell. */
const LAND_ALPHABET = '0123456789abcdefghijklmnopqrstuvwxyzABCDEFGHIJKLMNOPQRSTUVWXYZ-_.';

const literal = (value) => JSON.stringify(value);

export function berger1978() {
  const terms = (file, amplitude) =>
    rows(`orbit/berger1978_${file}_terms.csv`).map((row) => [
      number(row[amplitude]),
      number(row.rate_arcsec_per_year),
      number(row.phase_deg),
    ]);
  const constant = Object.fromEntries(
    rows('orbit/berger1978_constants.csv').map((row) => [row.name, number(row.value)]),
  );
  return `
    /** Amplitude, rate [arc seconds a year], phase [°]. */
    export type Berger1978Term = readonly [amplitude: number, rateArcsecPerYear: number, phaseDeg: number];

    export const BERGER_1978_MEAN_OBLIQUITY_DEG = ${constant.mean_obliquity};
    export const BERGER_1978_PRECESSION_RATE_ARCSEC_PER_YEAR = ${constant.mean_precession_rate};
    export const BERGER_1978_PRECESSION_PHASE_DEG = ${constant.precession_phase};

    /** Cosine terms of obliquity, amplitudes in arc seconds (table 1). */
    export const BERGER_1978_OBLIQUITY: readonly Berger1978Term[] = ${literal(terms('obliquity', 'amplitude_arcsec'))};

    /** Terms of e sin Π and e cos Π, amplitudes without unit (table 4). */
    export const BERGER_1978_ECCENTRICITY: readonly Berger1978Term[] = ${literal(terms('eccentricity', 'amplitude_dimensionless'))};

    /** Sine terms of general precession, amplitudes in arc seconds (table 5). */
    export const BERGER_1978_PRECESSION: readonly Berger1978Term[] = ${literal(terms('precession', 'amplitude_arcsec'))};
  `;
}

export function ar6Regions() {
  const regions = new Map();
  for (const row of rows('regions/ar6_reference_regions_v4_vertices.csv')) {
    const region = regions.get(row.acronym) ?? {
      code: row.acronym,
      name: row.name,
      kind: row.surface_type.toLowerCase(),
      continentOrOcean: row.continent_or_ocean,
      parts: [],
    };
    const part = (region.parts[number(row.part) - 1] ??= []);
    part.push([number(row.longitude_deg_east), number(row.latitude_deg_north)]);
    regions.set(row.acronym, region);
  }
  return `
    export interface Ar6Region {
      readonly code: string;
      readonly name: string;
      readonly kind: 'land' | 'ocean' | 'land-ocean';
      readonly continentOrOcean: string;
      /** rings of [longitude, latitude] in degrees, open, straight in longitude and latitude */
      readonly parts: readonly (readonly (readonly [lon: number, lat: number])[])[];
    }

    /** In table order, which decides where two regions overlap. */
    export const AR6_REGIONS: readonly Ar6Region[] = ${literal([...regions.values()])};
  `;
}

export function pmipSlices() {
  const slices = rows('gases/pmip_time_slices.csv').map((row) => ({
    name: row.slice,
    ageKaBp: number(row.age_ka_before_1950),
    orbit: {
      eccentricity: number(row.eccentricity),
      obliquityDeg: number(row.obliquity_deg),
      perihelionLongitudeDeg: number(row.longitude_of_perihelion_deg),
    },
    co2Ppm: number(row.co2_ppm),
    ch4Ppb: number(row.ch4_ppb),
    n2oPpb: number(row.n2o_ppb),
    solarConstantWm2: number(row.solar_constant_W_m2),
    source: row.source,
  }));
  return `
    export interface PmipSlice {
      readonly name: string;
      readonly ageKaBp: number;
      readonly orbit: {
        readonly eccentricity: number;
        readonly obliquityDeg: number;
        /** from the moving vernal equinox to the perihelion, about 102° in 1950 CE */
        readonly perihelionLongitudeDeg: number;
      };
      readonly co2Ppm: number;
      readonly ch4Ppb: number;
      readonly n2oPpb: number;
      readonly solarConstantWm2: number;
      readonly source: string;
    }

    export const PMIP_SLICES: readonly PmipSlice[] = ${literal(slices)};
  `;
}

export function parameters() {
  const seen = new Map();
  const list = rows('parameters/parameters.csv').map((row) => {
    const base = `${slugOf(row.symbol)}-${slugOf(row.scope)}`;
    const count = (seen.get(base) ?? 0) + 1;
    seen.set(base, count);
    return {
      id: count === 1 ? base : `${base}-${count}`,
      symbol: row.symbol,
      name: row.name,
      scope: row.scope,
      low: number(row.low),
      central: number(row.central),
      high: number(row.high),
      boundsMeaning: row.bounds_meaning,
      distribution: row.distribution,
      unit: row.unit,
      source: row.source,
      evidence: row.evidence,
      note: row.note,
    };
  });
  return `
    export interface Parameter {
      /** symbol and scope; a number follows where a table row repeats both with another source */
      readonly id: string;
      readonly symbol: string;
      readonly name: string;
      readonly scope: string;
      readonly low: number;
      readonly central: number;
      readonly high: number;
      /** what low and high mean, e.g. "1 sigma", "plausible range" */
      readonly boundsMeaning: string;
      readonly distribution: string;
      readonly unit: string;
      readonly source: string;
      /** "seen" (read in the source's abstract or page) or "from memory" */
      readonly evidence: string;
      readonly note: string;
    }

    export const PARAMETERS: readonly Parameter[] = ${literal(list)};
  `;
}

export function publishedEstimates() {
  const list = rows('estimates/published-estimates.csv').map((row) => ({
    id: row.id,
    quantity: row.quantity,
    forcingAgent: row.forcing_agent,
    region: row.region,
    timeSlice: row.time_slice,
    referenceState: row.reference_state,
    level: row.level,
    sky: row.sky,
    spectral: row.spectral,
    value: numberOrNull(row.value),
    low: numberOrNull(row.low),
    high: numberOrNull(row.high),
    uncertaintyMeaning: row.uncertainty_meaning,
    unit: row.unit,
    processes: row.processes,
    method: row.method,
    source: row.source,
    doi: textOrNull(row.doi),
    evidence: row.evidence,
    note: row.note,
  }));
  return `
    export interface PublishedEstimate {
      readonly id: string;
      readonly quantity: string;
      readonly forcingAgent: string;
      readonly region: string;
      readonly timeSlice: string;
      readonly referenceState: string;
      readonly level: string;
      readonly sky: string;
      readonly spectral: string;
      readonly value: number | null;
      readonly low: number | null;
      readonly high: number | null;
      readonly uncertaintyMeaning: string;
      readonly unit: string;
      readonly processes: string;
      readonly method: string;
      readonly source: string;
      readonly doi: string | null;
      readonly evidence: string;
      readonly note: string;
    }

    /** Compare an own result only with entries of the same quantity, level, sky, spectrum and reference. */
    export const PUBLISHED_ESTIMATES: readonly PublishedEstimate[] = ${literal(list)};
  `;
}

export function zonalBackdrop() {
  const share = (text) => (text.trim() === '' ? null : Number((number(text) / 100).toFixed(4)));
  const bands = rows('light/zonal_albedo_cloud_10deg.csv').map((row) => ({
    latitudeSouthDeg: number(row.lat_south),
    latitudeNorthDeg: number(row.lat_north),
    surfaceAlbedo: number(row.surface_albedo_era5),
    planetaryAlbedo: number(row.planetary_albedo_era5),
    cloudFraction: share(row.cloud_cover_percent_noresm2_pi),
    cloudFractionLand: share(row.cloud_cover_land_percent_noresm2_pi),
    cloudFractionOcean: share(row.cloud_cover_ocean_percent_noresm2_pi),
  }));
  return `
    export interface ZonalBand {
      readonly latitudeSouthDeg: number;
      readonly latitudeNorthDeg: number;
      /** present day, upward over downward shortwave at the surface */
      readonly surfaceAlbedo: number;
      readonly planetaryAlbedo: number;
      /** of a pre-industrial model run, not an observation */
      readonly cloudFraction: number;
      /** null where the band has no land */
      readonly cloudFractionLand: number | null;
      /** null where the band has no sea */
      readonly cloudFractionOcean: number | null;
    }

    /** Annual means in bands of 10°, from the South Pole northwards. */
    export const ZONAL_BACKDROP: readonly ZonalBand[] = ${literal(bands)};
  `;
}

export function dustOpticalDepth() {
  const list = rows('optics/dust_optical_depth.csv').map((row) => ({
    id: row.id,
    domain: row.domain,
    period: row.period,
    wavelengthNm: number(row.wavelength_nm),
    opticalDepth: number(row.value),
    uncertainty: number(row.uncertainty),
    source: row.source,
    doi: row.doi,
    note: row.note,
  }));
  return `
    export interface DustOpticalDepth {
      readonly id: string;
      readonly domain: string;
      readonly period: string;
      readonly wavelengthNm: number;
      readonly opticalDepth: number;
      readonly uncertainty: number;
      readonly source: string;
      readonly doi: string;
      readonly note: string;
    }

    /** Present-day dust optical depth by domain. Hemisphere and surface are marginal means, not a cross table. */
    export const DUST_OPTICAL_DEPTH: readonly DustOpticalDepth[] = ${literal(list)};
  `;
}

export function conventionalSlices() {
  const list = rows('slices/conventional-slices.csv').map((row) => ({
    slug: row.slug,
    name: row.name,
    shortLabel: row.short_label,
    kind: row.kind,
    stage: row.stage === 'yes',
    windowYoungKaBp: number(row.window_young_ka_BP),
    windowOldKaBp: number(row.window_old_ka_BP),
    orbitalAgeKaBp: number(row.orbital_age_ka_BP),
    co2Ppm: numberOrNull(row.co2_ppm),
    ch4Ppb: numberOrNull(row.ch4_ppb),
    n2oPpb: numberOrNull(row.n2o_ppb),
    pmipSlice: textOrNull(row.pmip_slice),
    referenceSlug: textOrNull(row.reference_slug),
    note: row.note,
    source: row.source,
  }));
  return `
    export interface ConventionalSlice {
      readonly slug: string;
      readonly name: string;
      readonly shortLabel: string;
      readonly kind: 'evidence' | 'scenario';
      /** true: a stratum of the column; false: a lens inside one */
      readonly stage: boolean;
      /** evidence window: samples of these ages count */
      readonly windowYoungKaBp: number;
      readonly windowOldKaBp: number;
      /** age of orbit and gases, apart from the window */
      readonly orbitalAgeKaBp: number;
      /** null where no protocol states it */
      readonly co2Ppm: number | null;
      readonly ch4Ppb: number | null;
      readonly n2oPpb: number | null;
      /** name of the row in PMIP_SLICES that holds the orbit, if one does */
      readonly pmipSlice: string | null;
      readonly referenceSlug: string | null;
      readonly note: string;
      readonly source: string;
    }

    /** Youngest first. */
    export const CONVENTIONAL_SLICES: readonly ConventionalSlice[] = ${literal(list)};
  `;
}

export function landFraction() {
  const lines = landCounts(2).map((row) => row.map((count) => LAND_ALPHABET[count]).join(''));
  return `
    /** Character n stands for n of 64 lattice points on land. */
    const ALPHABET = ${literal(LAND_ALPHABET)};

    /** One string per row from 90° S northwards, one character per cell from 180° W eastwards. */
    const ROWS: readonly string[] = ${literal(lines)};

    export const LAND_FRACTION_STEP_DEG = 2;
    export const LAND_FRACTION_ROWS = ${lines.length};
    export const LAND_FRACTION_COLUMNS = ${lines[0].length};

    /**
     * Present-day share of land in each cell of 2° [0 to 1], ice shelves counted as sea.
     * Row-major: index = row · 180 + column, rows from 90° S northwards, columns from 180° W eastwards.
     */
    export function landFraction2Deg(): Float64Array {
      const fractions = new Float64Array(LAND_FRACTION_ROWS * LAND_FRACTION_COLUMNS);
      ROWS.forEach((row, j) => {
        for (let i = 0; i < row.length; i += 1) {
          fractions[j * LAND_FRACTION_COLUMNS + i] = ALPHABET.indexOf(row.charAt(i)) / 64;
        }
      });
      return fractions;
    }
  `;
}
