import { readChoice, readNumber, readObject, refuseUnused, type NumberField } from '../physical/check-fields';
import type { Caution } from '../physical/domain-error';

export interface Gases {
  co2Ppm: number;
  ch4Ppb: number;
  n2oPpb: number;
}

export type GreenhouseFormula = 'myhre1998' | 'etminan2016' | 'meinshausen2020';

export interface GreenhouseRequest extends Gases {
  reference: Gases;
  formula: GreenhouseFormula;
}

export interface GreenhouseForcing {
  co2Wm2: number;
  ch4Wm2: number;
  n2oWm2: number;
  totalWm2: number;
}

export interface GreenhouseAnswer extends GreenhouseForcing {
  cautions: Caution[];
  method: { name: string; source: string };
}

const FIELDS: readonly (NumberField & { field: keyof Gases })[] = [
  { field: 'co2Ppm', unit: 'ppm', min: 1, max: 100_000 },
  { field: 'ch4Ppb', unit: 'ppb', min: 0, max: 1_000_000 },
  { field: 'n2oPpb', unit: 'ppb', min: 0, max: 100_000 },
];

/** Range of the fit, as stated in a library that carries it. */
const ETMINAN_RANGE: Record<keyof Gases, [number, number]> = {
  co2Ppm: [180, 2000],
  ch4Ppb: [340, 3500],
  n2oPpb: [200, 525],
};

const FORMULAS: Record<
  GreenhouseFormula,
  { name: string; source: string; of: (now: Gases, then: Gases) => number[] }
> = {
  myhre1998: {
    name: 'Myhre et al. 1998, stratosphere-adjusted',
    source: 'Myhre et al. (1998), Geophys. Res. Lett. 25, 2715–2718',
    of: myhre1998,
  },
  etminan2016: {
    name: 'Etminan et al. 2016, stratosphere-adjusted',
    source: 'Etminan et al. (2016), Geophys. Res. Lett. 43, 12614–12623',
    of: etminan2016,
  },
  meinshausen2020: {
    name: 'Meinshausen et al. 2020, stratosphere-adjusted',
    source: 'Meinshausen et al. (2020), Geosci. Model Dev. 13, 3571–3605',
    of: meinshausen2020,
  },
};

/**
 * Forcing of the well-mixed greenhouse gases between two states [W m⁻²], stratosphere-adjusted: not the effective
 * forcing, which is about 1.05, 0.86 and 1.07 times as large for CO₂, CH₄ and N₂O (from memory).
 *
 * Checked against: checks/general/ghg_forcing.csv, all schemes and baselines.
 */
export function greenhouseForcing(formula: GreenhouseFormula, now: Gases, then: Gases): GreenhouseForcing {
  const [co2Wm2, ch4Wm2, n2oWm2] = FORMULAS[formula].of(now, then) as [number, number, number];
  return { co2Wm2, ch4Wm2, n2oWm2, totalWm2: co2Wm2 + ch4Wm2 + n2oWm2 };
}

/** @throws DomainError naming the gas or the formula at fault */
export function calculateGreenhouse(request: GreenhouseRequest): GreenhouseAnswer {
  refuseUnused(request, ['co2Ppm', 'ch4Ppb', 'n2oPpb', 'reference', 'formula']);
  const formula = readChoice(request, 'formula', Object.keys(FORMULAS) as GreenhouseFormula[]);
  const now = readGases(request, '');
  const reference = readObject(request, 'reference');
  refuseUnused(
    reference,
    FIELDS.map(({ field }) => field),
    'reference.',
  );
  const then = readGases(reference, 'reference.');
  const { name, source } = FORMULAS[formula];
  return {
    ...greenhouseForcing(formula, now, then),
    cautions: formula === 'etminan2016' ? etminanCautions([now, then]) : [],
    method: { name, source },
  };
}

function readGases(given: object, prefix: string): Gases {
  const [co2Ppm, ch4Ppb, n2oPpb] = FIELDS.map((spec) => readNumber(given, spec, prefix)) as [
    number,
    number,
    number,
  ];
  return { co2Ppm, ch4Ppb, n2oPpb };
}

function etminanCautions(states: Gases[]): Caution[] {
  return FIELDS.filter(({ field }) =>
    states.some((gases) => gases[field] < ETMINAN_RANGE[field][0] || gases[field] > ETMINAN_RANGE[field][1]),
  ).map(({ field, unit }) => ({
    code: 'etminan2016-beyond-range',
    message: `${field} leaves ${ETMINAN_RANGE[field].join(' to ')} ${unit}, the range of the fit of Etminan et al. (2016).`,
  }));
}

function myhre1998(now: Gases, then: Gases): number[] {
  const overlap = (ch4: number, n2o: number) =>
    0.47 * Math.log(1 + 2.01e-5 * (ch4 * n2o) ** 0.75 + 5.31e-15 * ch4 * (ch4 * n2o) ** 1.52);
  const common = overlap(then.ch4Ppb, then.n2oPpb);
  return [
    5.35 * Math.log(now.co2Ppm / then.co2Ppm),
    0.036 * rootDifference(now.ch4Ppb, then.ch4Ppb) - (overlap(now.ch4Ppb, then.n2oPpb) - common),
    0.12 * rootDifference(now.n2oPpb, then.n2oPpb) - (overlap(then.ch4Ppb, now.n2oPpb) - common),
  ];
}

function etminan2016(now: Gases, then: Gases): number[] {
  const change = now.co2Ppm - then.co2Ppm;
  const co2 = (now.co2Ppm + then.co2Ppm) / 2;
  const ch4 = (now.ch4Ppb + then.ch4Ppb) / 2;
  const n2o = (now.n2oPpb + then.n2oPpb) / 2;
  const perLog = -2.4e-7 * change ** 2 + 7.2e-4 * Math.abs(change) - 2.1e-4 * n2o + 5.36;
  return [
    perLog * Math.log(now.co2Ppm / then.co2Ppm),
    (-1.3e-6 * ch4 - 8.2e-6 * n2o + 0.043) * rootDifference(now.ch4Ppb, then.ch4Ppb),
    (-8e-6 * co2 + 4.2e-6 * n2o - 4.9e-6 * ch4 + 0.117) * rootDifference(now.n2oPpb, then.n2oPpb),
  ];
}

function meinshausen2020(now: Gases, then: Gases): number[] {
  const [a, b, d] = [2.4785e-7, 7.5906e-4, 5.2488];
  // α rises from d at the reference to its top at C_max and stays there.
  const change = Math.min(Math.max(now.co2Ppm - then.co2Ppm, 0), b / (2 * a));
  const alpha = d - a * change ** 2 + b * change;
  const [rootCo2, rootCh4, rootN2o] = [Math.sqrt(now.co2Ppm), Math.sqrt(now.ch4Ppb), Math.sqrt(now.n2oPpb)];
  return [
    (alpha - 0.0021492 * rootN2o) * Math.log(now.co2Ppm / then.co2Ppm),
    (-8.9603e-5 * rootCh4 - 1.2462e-4 * rootN2o + 0.045194) * rootDifference(now.ch4Ppb, then.ch4Ppb),
    (-3.4197e-4 * rootCo2 + 2.5455e-4 * rootN2o - 2.4357e-4 * rootCh4 + 0.12173) *
      rootDifference(now.n2oPpb, then.n2oPpb),
  ];
}

function rootDifference(now: number, then: number): number {
  return Math.sqrt(now) - Math.sqrt(then);
}
