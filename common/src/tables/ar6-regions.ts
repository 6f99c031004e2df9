// Made by reference/generate.mjs: do not edit.
// From regions/ar6_reference_regions_v4_vertices.csv, reshaped. Iturbide et al. (2020), Earth Syst. Sci. Data 12, 2959-2970, CC BY 4.0.

export interface Ar6Region {
  readonly code: string;
  readonly name: string;
  readonly kind: 'land' | 'ocean' | 'land-ocean';
  readonly continentOrOcean: string;
  /** rings of [longitude, latitude] in degrees, open, straight in longitude and latitude */
  readonly parts: readonly (readonly (readonly [lon: number, lat: number])[])[];
}

/** In table order, which decides where two regions overlap. */
export const AR6_REGIONS: readonly Ar6Region[] = [
  {
    code: 'GIC',
    name: 'Greenland/Iceland',
    kind: 'land',
    continentOrOcean: 'POLAR',
    parts: [
      [
        [-10, 62],
        [-38, 62],
        [-42, 58],
        [-50, 58],
        [-82, 85],
        [-10, 85],
      ],
    ],
  },
  {
    code: 'NWN',
    name: 'N.W.North-America',
    kind: 'land',
    continentOrOcean: 'NORTH-AMERICA',
    parts: [
      [
        [-105, 50],
        [-130, 50],
        [-143, 58],
        [-168, 52.5],
        [-168, 72.6],
        [-129, 72.6],
        [-125, 77.6],
        [-105, 81],
      ],
    ],
  },
  {
    code: 'NEN',
    name: 'N.E.North-America',
    kind: 'land',
    continentOrOcean: 'NORTH-AMERICA',
    parts: [
      [
        [-50, 50],
        [-50, 58],
        [-82, 85],
        [-105, 81],
        [-105, 50],
      ],
    ],
  },
  {
    code: 'WNA',
    name: 'W.North-America',
    kind: 'land',
    continentOrOcean: 'NORTH-AMERICA',
    parts: [
      [
        [-130, 50],
        [-122.5, 33.8],
        [-105, 33.8],
        [-105, 50],
      ],
    ],
  },
  {
    code: 'CNA',
    name: 'C.North-America',
    kind: 'land',
    continentOrOcean: 'NORTH-AMERICA',
    parts: [
      [
        [-90, 50],
        [-90, 25],
        [-105, 33.8],
        [-105, 50],
      ],
    ],
  },
  {
    code: 'ENA',
    name: 'E.North-America',
    kind: 'land',
    continentOrOcean: 'NORTH-AMERICA',
    parts: [
      [
        [-70, 25],
        [-90, 25],
        [-90, 50],
        [-50, 50],
        [-77, 31],
      ],
    ],
  },
  {
    code: 'NCA',
    name: 'N.Central-America',
    kind: 'land',
    continentOrOcean: 'CENTRAL-AMERICA',
    parts: [
      [
        [-90, 25],
        [-104.5, 16],
        [-122.5, 33.8],
        [-105, 33.8],
      ],
    ],
  },
  {
    code: 'SCA',
    name: 'S.Central-America',
    kind: 'land',
    continentOrOcean: 'CENTRAL-AMERICA',
    parts: [
      [
        [-75, 12],
        [-83.4, 2.2],
        [-104.5, 16],
        [-90, 25],
      ],
    ],
  },
  {
    code: 'CAR',
    name: 'Caribbean',
    kind: 'land-ocean',
    continentOrOcean: 'CENTRAL-AMERICA',
    parts: [
      [
        [-75, 12],
        [-90, 25],
        [-70, 25],
        [-55, 12],
      ],
    ],
  },
  {
    code: 'NWS',
    name: 'N.W.South-America',
    kind: 'land',
    continentOrOcean: 'SOUTH-AMERICA',
    parts: [
      [
        [-75, 12],
        [-83.4, 2.2],
        [-83.4, -10],
        [-79, -15],
        [-72, -15],
        [-72, 12],
      ],
    ],
  },
  {
    code: 'NSA',
    name: 'N.South-America',
    kind: 'land',
    continentOrOcean: 'SOUTH-AMERICA',
    parts: [
      [
        [-72, 12],
        [-72, -8],
        [-50, -8],
        [-50, 7.6],
        [-55, 12],
      ],
    ],
  },
  {
    code: 'NES',
    name: 'N.E.South-America',
    kind: 'land',
    continentOrOcean: 'SOUTH-AMERICA',
    parts: [
      [
        [-34, -20],
        [-50, -20],
        [-50, 0],
        [-34, 0],
      ],
    ],
  },
  {
    code: 'SAM',
    name: 'South-American-Monsoon',
    kind: 'land',
    continentOrOcean: 'SOUTH-AMERICA',
    parts: [
      [
        [-66.4, -20],
        [-72, -15],
        [-72, -8],
        [-50, -8],
        [-50, -20],
      ],
    ],
  },
  {
    code: 'SWS',
    name: 'S.W.South-America',
    kind: 'land',
    continentOrOcean: 'SOUTH-AMERICA',
    parts: [
      [
        [-72, -15],
        [-66.4, -20],
        [-71.5, -47],
        [-79, -47],
        [-74.6, -20],
        [-79, -15],
      ],
    ],
  },
  {
    code: 'SES',
    name: 'S.E.South-America',
    kind: 'land',
    continentOrOcean: 'SOUTH-AMERICA',
    parts: [
      [
        [-34, -20],
        [-56, -40],
        [-70.2, -40],
        [-66.4, -20],
      ],
    ],
  },
  {
    code: 'SSA',
    name: 'S.South-America',
    kind: 'land',
    continentOrOcean: 'SOUTH-AMERICA',
    parts: [
      [
        [-79, -56],
        [-79, -47],
        [-71.5, -47],
        [-70.2, -40],
        [-56, -40],
        [-56, -56],
      ],
    ],
  },
  {
    code: 'NEU',
    name: 'N.Europe',
    kind: 'land',
    continentOrOcean: 'EUROPE',
    parts: [
      [
        [-10, 48],
        [-10, 72.6],
        [40, 72.6],
        [40, 61.3],
      ],
    ],
  },
  {
    code: 'WCE',
    name: 'West&Central-Europe',
    kind: 'land',
    continentOrOcean: 'EUROPE',
    parts: [
      [
        [-10, 45],
        [-10, 48],
        [40, 61.3],
        [40, 45],
      ],
    ],
  },
  {
    code: 'EEU',
    name: 'E.Europe',
    kind: 'land',
    continentOrOcean: 'EUROPE',
    parts: [
      [
        [40, 45],
        [40, 65],
        [60, 65],
        [60, 45],
      ],
    ],
  },
  {
    code: 'MED',
    name: 'Mediterranean',
    kind: 'land-ocean',
    continentOrOcean: 'EUROPE-AFRICA',
    parts: [
      [
        [-10, 30],
        [-10, 45],
        [40, 45],
        [40, 30],
      ],
    ],
  },
  {
    code: 'SAH',
    name: 'Sahara',
    kind: 'land',
    continentOrOcean: 'AFRICA',
    parts: [
      [
        [-20, 14.7],
        [-20, 30],
        [33, 30],
        [42.1, 14.7],
      ],
    ],
  },
  {
    code: 'WAF',
    name: 'Western-Africa',
    kind: 'land',
    continentOrOcean: 'AFRICA',
    parts: [
      [
        [-20, 7.6],
        [-20, 14.7],
        [15, 14.7],
        [8, 0],
      ],
    ],
  },
  {
    code: 'CAF',
    name: 'Central-Africa',
    kind: 'land',
    continentOrOcean: 'AFRICA',
    parts: [
      [
        [8, -10],
        [8, 0],
        [15, 14.7],
        [27, 14.7],
        [27, -10],
      ],
    ],
  },
  {
    code: 'NEAF',
    name: 'N.Eastern-Africa',
    kind: 'land',
    continentOrOcean: 'AFRICA',
    parts: [
      [
        [27, 2.3],
        [27, 14.7],
        [42.1, 14.7],
        [43.7, 12],
        [53, 15],
        [53, 7],
        [46.5, 2.3],
      ],
    ],
  },
  {
    code: 'SEAF',
    name: 'S.Eastern-Africa',
    kind: 'land',
    continentOrOcean: 'AFRICA',
    parts: [
      [
        [27, -10],
        [27, 2.3],
        [46.5, 2.3],
        [46.5, -10],
      ],
    ],
  },
  {
    code: 'WSAF',
    name: 'W.Southern-Africa',
    kind: 'land',
    continentOrOcean: 'AFRICA',
    parts: [
      [
        [8, -36],
        [8, -10],
        [25, -10],
        [25, -36],
      ],
    ],
  },
  {
    code: 'ESAF',
    name: 'E.Southern-Africa',
    kind: 'land',
    continentOrOcean: 'AFRICA',
    parts: [
      [
        [25, -10],
        [25, -36],
        [31, -36],
        [46.5, -10],
      ],
    ],
  },
  {
    code: 'MDG',
    name: 'Madagascar',
    kind: 'land',
    continentOrOcean: 'AFRICA',
    parts: [
      [
        [36.2, -27],
        [46.5, -10],
        [53, -10],
        [53, -27],
      ],
    ],
  },
  {
    code: 'RAR',
    name: 'Russian-Arctic',
    kind: 'land',
    continentOrOcean: 'ASIA',
    parts: [
      [
        [40, 65],
        [40, 72.6],
        [94, 82],
        [180, 73.8],
        [180, 65],
      ],
      [
        [-180, 73.8],
        [-180, 65],
        [-168, 65],
        [-168, 72.6],
      ],
    ],
  },
  {
    code: 'WSB',
    name: 'W.Siberia',
    kind: 'land',
    continentOrOcean: 'ASIA',
    parts: [
      [
        [60, 45],
        [60, 65],
        [90, 65],
        [90, 45],
      ],
    ],
  },
  {
    code: 'ESB',
    name: 'E.Siberia',
    kind: 'land',
    continentOrOcean: 'ASIA',
    parts: [
      [
        [90, 45],
        [90, 65],
        [130, 65],
        [130, 45],
      ],
    ],
  },
  {
    code: 'RFE',
    name: 'Russian-Far-East',
    kind: 'land',
    continentOrOcean: 'ASIA',
    parts: [
      [
        [130, 45],
        [130, 65],
        [180, 65],
        [180, 59.9],
        [157, 50],
        [152, 45],
      ],
    ],
  },
  {
    code: 'WCA',
    name: 'W.C.Asia',
    kind: 'land',
    continentOrOcean: 'ASIA',
    parts: [
      [
        [40, 30],
        [40, 45],
        [75, 45],
        [75, 30],
        [60, 30],
        [60, 23.5],
        [47.6, 30],
      ],
    ],
  },
  {
    code: 'ECA',
    name: 'E.C.Asia',
    kind: 'land',
    continentOrOcean: 'ASIA',
    parts: [
      [
        [75, 37],
        [75, 45],
        [117, 45],
        [108, 37],
      ],
    ],
  },
  {
    code: 'TIB',
    name: 'Tibetan-Plateau',
    kind: 'land',
    continentOrOcean: 'ASIA',
    parts: [
      [
        [75, 30],
        [75, 37],
        [100, 37],
        [100, 30],
        [88, 26],
      ],
    ],
  },
  {
    code: 'EAS',
    name: 'E.Asia',
    kind: 'land',
    continentOrOcean: 'ASIA',
    parts: [
      [
        [100, 19.5],
        [100, 37],
        [108, 37],
        [117, 45],
        [152, 45],
        [132, 25],
        [132, 19.5],
      ],
    ],
  },
  {
    code: 'ARP',
    name: 'Arabian-Peninsula',
    kind: 'land',
    continentOrOcean: 'ASIA',
    parts: [
      [
        [33, 30],
        [47.6, 30],
        [60, 23.5],
        [60, 19.5],
        [53, 15],
        [43.7, 12],
      ],
    ],
  },
  {
    code: 'SAS',
    name: 'S.Asia',
    kind: 'land',
    continentOrOcean: 'ASIA',
    parts: [
      [
        [60, 23.5],
        [60, 30],
        [75, 30],
        [88, 26],
        [100, 30],
        [100, 19.5],
        [95, 19.5],
        [87, 19.5],
        [79, 7],
        [76, 7],
        [70, 19.5],
        [66.5, 23.5],
      ],
    ],
  },
  {
    code: 'SEA',
    name: 'S.E.Asia',
    kind: 'land-ocean',
    continentOrOcean: 'ASIA',
    parts: [
      [
        [93, -10],
        [93, 19.5],
        [132, 19.5],
        [132, 5],
        [155, -10],
      ],
    ],
  },
  {
    code: 'NAU',
    name: 'N.Australia',
    kind: 'land',
    continentOrOcean: 'OCEANIA',
    parts: [
      [
        [110, -20],
        [110, -10],
        [155, -10],
        [155, -20],
      ],
    ],
  },
  {
    code: 'CAU',
    name: 'C.Australia',
    kind: 'land',
    continentOrOcean: 'OCEANIA',
    parts: [
      [
        [110, -30],
        [110, -20],
        [145.5, -20],
        [145.5, -32.9],
        [140, -30],
      ],
    ],
  },
  {
    code: 'EAU',
    name: 'E.Australia',
    kind: 'land',
    continentOrOcean: 'OCEANIA',
    parts: [
      [
        [145.5, -32.9],
        [145.5, -20],
        [155, -20],
        [155, -38],
      ],
    ],
  },
  {
    code: 'SAU',
    name: 'S.Australia',
    kind: 'land',
    continentOrOcean: 'OCEANIA',
    parts: [
      [
        [110, -36],
        [110, -30],
        [140, -30],
        [155, -38],
        [155, -50],
      ],
    ],
  },
  {
    code: 'NZ',
    name: 'New-Zealand',
    kind: 'land',
    continentOrOcean: 'OCEANIA',
    parts: [
      [
        [155, -50],
        [155, -30],
        [180, -30],
        [180, -50],
      ],
    ],
  },
  {
    code: 'EAN',
    name: 'E.Antarctica',
    kind: 'land',
    continentOrOcean: 'POLAR',
    parts: [
      [
        [-180, -90],
        [-180, -83],
        [-56, -83],
        [-56, -75],
        [-25, -75],
        [5, -64],
        [180, -64],
        [180, -90],
      ],
    ],
  },
  {
    code: 'WAN',
    name: 'W.Antarctica',
    kind: 'land',
    continentOrOcean: 'POLAR',
    parts: [
      [
        [-180, -83],
        [-180, -70],
        [-80, -70],
        [-65, -62],
        [-56, -62],
        [-56, -83],
      ],
    ],
  },
  {
    code: 'ARO',
    name: 'Arctic-Ocean',
    kind: 'ocean',
    continentOrOcean: 'ARCTIC',
    parts: [
      [
        [-180, 90],
        [-180, 73.8],
        [-168, 72.6],
        [-129, 72.6],
        [-125, 77.6],
        [-82, 85],
        [-10, 85],
        [-10, 72.6],
        [40, 72.6],
        [94, 82],
        [180, 73.8],
        [180, 90],
      ],
    ],
  },
  {
    code: 'NPO',
    name: 'N.Pacific-Ocean',
    kind: 'ocean',
    continentOrOcean: 'PACIFIC',
    parts: [
      [
        [132, 7.6],
        [132, 25],
        [157, 50],
        [180, 59.9],
        [180, 7.6],
      ],
      [
        [-180, 7.6],
        [-180, 65],
        [-168, 65],
        [-168, 52.5],
        [-143, 58],
        [-130, 50],
        [-122.5, 33.8],
        [-104.5, 16],
        [-91.7, 7.6],
      ],
    ],
  },
  {
    code: 'EPO',
    name: 'Equatorial.Pacific-Ocean',
    kind: 'ocean',
    continentOrOcean: 'PACIFIC',
    parts: [
      [
        [155, -10],
        [132, 5],
        [132, 7.6],
        [180, 7.6],
        [180, -10],
      ],
      [
        [-180, -10],
        [-180, 7.6],
        [-91.7, 7.6],
        [-83.4, 2.2],
        [-83.4, -10],
      ],
    ],
  },
  {
    code: 'SPO',
    name: 'S.Pacific-Ocean',
    kind: 'ocean',
    continentOrOcean: 'PACIFIC',
    parts: [
      [
        [180, -10],
        [180, -30],
        [155, -30],
        [155, -10],
      ],
      [
        [-180, -56],
        [-180, -10],
        [-83.4, -10],
        [-74.6, -20],
        [-79, -47],
        [-79, -56],
      ],
    ],
  },
  {
    code: 'NAO',
    name: 'N.Atlantic-Ocean',
    kind: 'ocean',
    continentOrOcean: 'ATLANTIC',
    parts: [
      [
        [-50, 7.6],
        [-77, 31],
        [-50, 50],
        [-50, 58],
        [-42, 58],
        [-38, 62],
        [-10, 62],
        [-10, 30],
        [-20, 30],
        [-20, 7.6],
      ],
    ],
  },
  {
    code: 'EAO',
    name: 'Equatorial.Atlantic-Ocean',
    kind: 'ocean',
    continentOrOcean: 'ATLANTIC',
    parts: [
      [
        [-34, -10],
        [-34, 0],
        [-50, 0],
        [-50, 7.6],
        [-20, 7.6],
        [8, 0],
        [8, -10],
      ],
    ],
  },
  {
    code: 'SAO',
    name: 'S.Atlantic-Ocean',
    kind: 'ocean',
    continentOrOcean: 'ATLANTIC',
    parts: [
      [
        [-56, -56],
        [-56, -40],
        [-34, -20],
        [-34, -10],
        [8, -10],
        [8, -36],
      ],
    ],
  },
  {
    code: 'ARS',
    name: 'Arabian-Sea',
    kind: 'ocean',
    continentOrOcean: 'INDIAN',
    parts: [
      [
        [53, 7],
        [53, 15],
        [60, 19.5],
        [60, 23.5],
        [66.5, 23.5],
        [70, 19.5],
        [76, 7],
      ],
    ],
  },
  {
    code: 'BOB',
    name: 'Bay-of-Bengal',
    kind: 'ocean',
    continentOrOcean: 'INDIAN',
    parts: [
      [
        [79, 7],
        [87, 19.5],
        [93, 19.5],
        [93, 7],
      ],
    ],
  },
  {
    code: 'EIO',
    name: 'Equatorial.Indic-Ocean',
    kind: 'ocean',
    continentOrOcean: 'INDIAN',
    parts: [
      [
        [46.5, -10],
        [46.5, 2.3],
        [53, 7],
        [93, 7],
        [93, -10],
      ],
    ],
  },
  {
    code: 'SIO',
    name: 'S.Indic-Ocean',
    kind: 'ocean',
    continentOrOcean: 'INDIAN',
    parts: [
      [
        [36.2, -27],
        [53, -27],
        [53, -10],
        [110, -10],
        [110, -36],
        [31, -36],
      ],
    ],
  },
  {
    code: 'SOO',
    name: 'Southern-Ocean',
    kind: 'ocean',
    continentOrOcean: 'SOUTHERN',
    parts: [
      [
        [-180, -56],
        [-180, -70],
        [-80, -70],
        [-65, -62],
        [-56, -62],
        [-56, -75],
        [-25, -75],
        [5, -64],
        [180, -64],
        [180, -50],
        [155, -50],
        [110, -36],
        [8, -36],
        [-56, -56],
      ],
    ],
  },
];
