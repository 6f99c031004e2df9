// Made by reference/generate.mjs: do not edit.
// From optics/dust_optical_depth.csv. Gkikas et al. (2022), Atmos. Chem. Phys. 22, 3553.

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
export const DUST_OPTICAL_DEPTH: readonly DustOpticalDepth[] = [
  {
    id: 'gkikas2022_global',
    domain: 'global',
    period: '2003-2017',
    wavelengthNm: 550,
    opticalDepth: 0.032,
    uncertainty: 0.003,
    source: 'Gkikas et al. 2022, Atmos. Chem. Phys. 22, 3553',
    doi: '10.5194/acp-22-3553-2022',
    note: 'abstract; 23.4 % of AOD',
  },
  {
    id: 'gkikas2022_nh',
    domain: 'northern hemisphere',
    period: '2003-2017',
    wavelengthNm: 550,
    opticalDepth: 0.056,
    uncertainty: 0.004,
    source: 'Gkikas et al. 2022',
    doi: '10.5194/acp-22-3553-2022',
    note: '31.8 % of AOD',
  },
  {
    id: 'gkikas2022_sh',
    domain: 'southern hemisphere',
    period: '2003-2017',
    wavelengthNm: 550,
    opticalDepth: 0.008,
    uncertainty: 0.001,
    source: 'Gkikas et al. 2022',
    doi: '10.5194/acp-22-3553-2022',
    note: '8.2 % of AOD',
  },
  {
    id: 'gkikas2022_land',
    domain: 'land',
    period: '2003-2017',
    wavelengthNm: 550,
    opticalDepth: 0.07,
    uncertainty: 0.005,
    source: 'Gkikas et al. 2022',
    doi: '10.5194/acp-22-3553-2022',
    note: '',
  },
  {
    id: 'gkikas2022_ocean',
    domain: 'ocean',
    period: '2003-2017',
    wavelengthNm: 550,
    opticalDepth: 0.019,
    uncertainty: 0.002,
    source: 'Gkikas et al. 2022',
    doi: '10.5194/acp-22-3553-2022',
    note: '',
  },
];
