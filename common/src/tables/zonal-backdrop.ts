// Made by reference/generate.mjs: do not edit.
// From light/zonal_albedo_cloud_10deg.csv. Hersbach et al. (2023), contains modified Copernicus Climate Change Service information; Seland et al. (2020), Geosci. Model Dev. 13, 6165-6200; zonal tables by Gunning et al. (2025), Geosci. Model Dev. 18, 2479.

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
export const ZONAL_BACKDROP: readonly ZonalBand[] = [
  {
    latitudeSouthDeg: -90,
    latitudeNorthDeg: -80,
    surfaceAlbedo: 0.837,
    planetaryAlbedo: 0.701,
    cloudFraction: 0.59,
    cloudFractionLand: 0.59,
    cloudFractionOcean: null,
  },
  {
    latitudeSouthDeg: -80,
    latitudeNorthDeg: -70,
    surfaceAlbedo: 0.772,
    planetaryAlbedo: 0.653,
    cloudFraction: 0.649,
    cloudFractionLand: 0.597,
    cloudFractionOcean: 0.749,
  },
  {
    latitudeSouthDeg: -70,
    latitudeNorthDeg: -60,
    surfaceAlbedo: 0.401,
    planetaryAlbedo: 0.478,
    cloudFraction: 0.862,
    cloudFractionLand: 0.753,
    cloudFractionOcean: 0.877,
  },
  {
    latitudeSouthDeg: -60,
    latitudeNorthDeg: -50,
    surfaceAlbedo: 0.086,
    planetaryAlbedo: 0.376,
    cloudFraction: 0.895,
    cloudFractionLand: 0.856,
    cloudFractionOcean: 0.895,
  },
  {
    latitudeSouthDeg: -50,
    latitudeNorthDeg: -40,
    surfaceAlbedo: 0.063,
    planetaryAlbedo: 0.338,
    cloudFraction: 0.804,
    cloudFractionLand: 0.674,
    cloudFractionOcean: 0.808,
  },
  {
    latitudeSouthDeg: -40,
    latitudeNorthDeg: -30,
    surfaceAlbedo: 0.069,
    planetaryAlbedo: 0.278,
    cloudFraction: 0.621,
    cloudFractionLand: 0.475,
    cloudFractionOcean: 0.64,
  },
  {
    latitudeSouthDeg: -30,
    latitudeNorthDeg: -20,
    surfaceAlbedo: 0.083,
    planetaryAlbedo: 0.238,
    cloudFraction: 0.486,
    cloudFractionLand: 0.391,
    cloudFractionOcean: 0.514,
  },
  {
    latitudeSouthDeg: -20,
    latitudeNorthDeg: -10,
    surfaceAlbedo: 0.072,
    planetaryAlbedo: 0.221,
    cloudFraction: 0.515,
    cloudFractionLand: 0.538,
    cloudFractionOcean: 0.509,
  },
  {
    latitudeSouthDeg: -10,
    latitudeNorthDeg: 0,
    surfaceAlbedo: 0.068,
    planetaryAlbedo: 0.227,
    cloudFraction: 0.577,
    cloudFractionLand: 0.684,
    cloudFractionOcean: 0.543,
  },
  {
    latitudeSouthDeg: 0,
    latitudeNorthDeg: 10,
    surfaceAlbedo: 0.071,
    planetaryAlbedo: 0.246,
    cloudFraction: 0.662,
    cloudFractionLand: 0.723,
    cloudFractionOcean: 0.645,
  },
  {
    latitudeSouthDeg: 10,
    latitudeNorthDeg: 20,
    surfaceAlbedo: 0.108,
    planetaryAlbedo: 0.226,
    cloudFraction: 0.52,
    cloudFractionLand: 0.494,
    cloudFractionOcean: 0.531,
  },
  {
    latitudeSouthDeg: 20,
    latitudeNorthDeg: 30,
    surfaceAlbedo: 0.143,
    planetaryAlbedo: 0.247,
    cloudFraction: 0.449,
    cloudFractionLand: 0.347,
    cloudFractionOcean: 0.513,
  },
  {
    latitudeSouthDeg: 30,
    latitudeNorthDeg: 40,
    surfaceAlbedo: 0.153,
    planetaryAlbedo: 0.282,
    cloudFraction: 0.538,
    cloudFractionLand: 0.424,
    cloudFractionOcean: 0.623,
  },
  {
    latitudeSouthDeg: 40,
    latitudeNorthDeg: 50,
    surfaceAlbedo: 0.157,
    planetaryAlbedo: 0.325,
    cloudFraction: 0.635,
    cloudFractionLand: 0.495,
    cloudFractionOcean: 0.788,
  },
  {
    latitudeSouthDeg: 50,
    latitudeNorthDeg: 60,
    surfaceAlbedo: 0.193,
    planetaryAlbedo: 0.377,
    cloudFraction: 0.758,
    cloudFractionLand: 0.696,
    cloudFractionOcean: 0.845,
  },
  {
    latitudeSouthDeg: 60,
    latitudeNorthDeg: 70,
    surfaceAlbedo: 0.334,
    planetaryAlbedo: 0.44,
    cloudFraction: 0.788,
    cloudFractionLand: 0.769,
    cloudFractionOcean: 0.837,
  },
  {
    latitudeSouthDeg: 70,
    latitudeNorthDeg: 80,
    surfaceAlbedo: 0.587,
    planetaryAlbedo: 0.549,
    cloudFraction: 0.775,
    cloudFractionLand: 0.717,
    cloudFractionOcean: 0.8,
  },
  {
    latitudeSouthDeg: 80,
    latitudeNorthDeg: 90,
    surfaceAlbedo: 0.714,
    planetaryAlbedo: 0.607,
    cloudFraction: 0.767,
    cloudFractionLand: 0.649,
    cloudFractionOcean: 0.782,
  },
];
