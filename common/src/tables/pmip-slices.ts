// Made by reference/generate.mjs: do not edit.
// From gases/pmip_time_slices.csv. The source of each row is in the row.

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

export const PMIP_SLICES: readonly PmipSlice[] = [
  {
    name: 'pre-industrial (PMIP3)',
    ageKaBp: 0,
    orbit: { eccentricity: 0.016724, obliquityDeg: 23.446, perihelionLongitudeDeg: 102.04 },
    co2Ppm: 280,
    ch4Ppb: 760,
    n2oPpb: 270,
    solarConstantWm2: 1365,
    source: 'PMIP3 PI design page (seen)',
  },
  {
    name: 'pre-industrial (CMIP6 piControl, 1850 CE)',
    ageKaBp: 0.1,
    orbit: { eccentricity: 0.016764, obliquityDeg: 23.459, perihelionLongitudeDeg: 100.33 },
    co2Ppm: 284.3,
    ch4Ppb: 808.2,
    n2oPpb: 273,
    solarConstantWm2: 1360.747,
    source:
      'PMIP4 protocol papers (from memory); eccentricity 0.01676, obliquity 23.459 and perihelion 100.327 also on the PMIP3 last-millennium page (seen)',
  },
  {
    name: 'mid-Holocene (PMIP3)',
    ageKaBp: 6,
    orbit: { eccentricity: 0.018682, obliquityDeg: 24.105, perihelionLongitudeDeg: 0.87 },
    co2Ppm: 280,
    ch4Ppb: 650,
    n2oPpb: 270,
    solarConstantWm2: 1365,
    source:
      'PMIP3 and CMIP6 mid-Holocene design pages for orbit and gases (seen); equinox date and solar constant as in the PMIP3 PI page',
  },
  {
    name: 'mid-Holocene (PMIP4)',
    ageKaBp: 6,
    orbit: { eccentricity: 0.018682, obliquityDeg: 24.105, perihelionLongitudeDeg: 0.87 },
    co2Ppm: 264.4,
    ch4Ppb: 597,
    n2oPpb: 262,
    solarConstantWm2: 1360.747,
    source: 'orbit seen; gases seen in a public model run script; solar constant from memory',
  },
  {
    name: 'last glacial maximum (PMIP4)',
    ageKaBp: 21,
    orbit: { eccentricity: 0.018994, obliquityDeg: 22.949, perihelionLongitudeDeg: 114.42 },
    co2Ppm: 190,
    ch4Ppb: 375,
    n2oPpb: 200,
    solarConstantWm2: 1360.747,
    source: 'PMIP4 LGM design page: orbit, equinox, gases (seen); solar constant from memory',
  },
  {
    name: 'last interglacial (PMIP4 lig127k)',
    ageKaBp: 127,
    orbit: { eccentricity: 0.039378, obliquityDeg: 24.04, perihelionLongitudeDeg: 275.41 },
    co2Ppm: 275,
    ch4Ppb: 685,
    n2oPpb: 255,
    solarConstantWm2: 1360.747,
    source:
      'orbit and gases seen in a public model run script; equinox date seen on a PMIP4 design page; solar constant from memory',
  },
];
