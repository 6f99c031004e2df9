import { medianRadiusFromMassMedianDiameter } from './lognormal-mode';
import { parameterRow, type ParticleSet, type SetMode } from './optical-set';

const LOW_ABSORPTION = 'dust-composite';
const HIGH_ABSORPTION = 'dust-woodward-2001';
const ZENDER =
  'size: Zender, Bian & Newman (2003), J. Geophys. Res. 108, 4416 (mass median diameter 3.5 µm, σ 2.0)';
const HESS = 'size: Hess, Koepke & Schult (1998), Bull. Am. Meteorol. Soc. 79, 831–844';
const SIZE_FROM_MEMORY = 'index table read, size parameters from memory';
const COARSE_ALONE =
  'The row is for whole dust; the coarse part alone scatters further ahead, and no interval by size is at hand.';

const DUST = {
  kind: 'particles',
  species: 'dust',
  densityGCm3: parameterRow('rho-dust-clay-rich-fine').central,
  kappa: 0,
  relativeHumidity: 0,
  outside: [],
} as const;

const DUST_ROWS = {
  massExtinction: 'mee-dust-model-median-with-mostly-10-um',
  singleScatteringAlbedo: 'omega0-dust-19-soils-laboratory',
  asymmetry: 'g-dust',
};

/** One mode by its median diameter by mass, between two diameters [µm]. */
function byMass(massMedianDiameterUm: number, sigma: number, fromUm: number, toUm: number): SetMode[] {
  return [
    {
      medianRadiusUm: medianRadiusFromMassMedianDiameter(massMedianDiameterUm, sigma),
      geometricStdDev: sigma,
      minRadiusUm: fromUm / 2,
      maxRadiusUm: toUm / 2,
      numberFraction: 1,
    },
  ];
}

/** The three mineral modes of desert aerosol, up to a diameter [µm]: 269.5, 30.5 and 0.142 particles of each. */
function desertModes(toUm: number): SetMode[] {
  const modes = [
    [0.07, 1.95, 269.5],
    [0.39, 2, 30.5],
    [1.9, 2.15, 0.142],
  ] as const;
  return modes.map(([medianRadiusUm, geometricStdDev, count]) => ({
    medianRadiusUm,
    geometricStdDev,
    minRadiusUm: 0.005,
    maxRadiusUm: toUm / 2,
    numberFraction: count / 300.142,
  }));
}

const indexSource = (material: string) =>
  material === LOW_ABSORPTION
    ? 'index: composite of mineral species (Balkanski et al. 2007; Di Biagio et al. 2017)'
    : 'index: Woodward (2001), J. Geophys. Res. 106, 18155–18166';

function zenderDust(id: string, title: string, material: string): ParticleSet {
  return {
    ...DUST,
    id,
    title,
    source: `${ZENDER}; ${indexSource(material)}`,
    evidence: SIZE_FROM_MEMORY,
    note: 'Diameters 0.1 to 10 µm.',
    material,
    modes: byMass(3.5, 2, 0.1, 10),
    heldAgainst: DUST_ROWS,
  };
}

function desertDust(
  set: Pick<ParticleSet, 'id' | 'title' | 'note' | 'heldAgainst'>,
  toUm: number,
): ParticleSet {
  return {
    ...DUST,
    ...set,
    source: `${HESS}, desert; ${indexSource(LOW_ABSORPTION)}`,
    evidence: SIZE_FROM_MEMORY,
    material: LOW_ABSORPTION,
    modes: desertModes(toUm),
  };
}

/** Dust: fine and coarse, weakly and strongly absorbing, of three published size distributions and one assumed. */
export const READY_MADE_DUST: readonly ParticleSet[] = [
  zenderDust('dust-pm10-low-absorption', 'Dust below 10 µm, low absorption', LOW_ABSORPTION),
  zenderDust('dust-pm10-high-absorption', 'Dust below 10 µm, high absorption', HIGH_ABSORPTION),
  desertDust(
    {
      id: 'dust-pm20-desert',
      title: 'Desert dust below 20 µm',
      note: 'Three mineral modes, diameters to 20 µm.',
      heldAgainst: { ...DUST_ROWS, massExtinction: 'mee-dust-pm20-mix-present' },
    },
    20,
  ),
  desertDust(
    {
      id: 'dust-fine',
      title: 'Fine dust below 2.5 µm',
      note: 'The three mineral modes cut at 2.5 µm diameter.',
      heldAgainst: { ...DUST_ROWS, massExtinction: 'mee-dust-diameter-2-5-um' },
    },
    2.5,
  ),
  {
    ...zenderDust('dust-coarse', 'Coarse dust, 2.5 to 10 µm', LOW_ABSORPTION),
    note: 'Diameters 2.5 to 10 µm.',
    modes: byMass(3.5, 2, 2.5, 10),
    heldAgainst: { ...DUST_ROWS, massExtinction: 'mee-dust-diameter-2-5-10-um' },
    outside: [{ quantity: 'asymmetry', reason: COARSE_ALONE }],
  },
  {
    ...DUST,
    id: 'dust-transported',
    title: 'Transported mineral dust',
    source: `${HESS}, transported mineral; ${indexSource(LOW_ABSORPTION)}`,
    evidence: 'size parameters and index table read',
    note: 'Radii 0.02 to 5 µm.',
    material: LOW_ABSORPTION,
    modes: [
      { medianRadiusUm: 0.5, geometricStdDev: 2.2, minRadiusUm: 0.02, maxRadiusUm: 5, numberFraction: 1 },
    ],
    heldAgainst: DUST_ROWS,
  },
  {
    ...DUST,
    id: 'dust-glacial-loess-like',
    title: 'Glacial, loess-like dust',
    source: `size: round assumption, mass median diameter 5 µm, σ 2.0, diameters 0.1 to 20 µm; ${indexSource(LOW_ABSORPTION)}`,
    evidence: 'assumption: between the 1.5 to 2.5 µm of ice cores and the 20 to 30 µm of loess (from memory)',
    note: 'For dust on its way near outwash plains. Loess itself is coarser, dust in ice cores finer.',
    densityGCm3: parameterRow('rho-dust-quartz-feldspar-silt').central,
    material: LOW_ABSORPTION,
    modes: byMass(5, 2, 0.1, 20),
    heldAgainst: DUST_ROWS,
  },
];
