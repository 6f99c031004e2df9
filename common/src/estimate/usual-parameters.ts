import { DomainError } from '../physical/domain-error';
import { distributionFromBounds } from '../statistics/distribution-from-bounds';
import { normalQuantile } from '../statistics/normal-quantile';
import { DUST_OPTICAL_DEPTH } from '../tables/dust-optical-depth';
import { type Parameter, PARAMETERS } from '../tables/parameters';
import type { EstimateInputs, VariedParameter } from './estimate-inputs';

export interface Bounds {
  low: number;
  central: number;
  high: number;
}

/** Ranges of the optical set in use, and what the run leaves to the parameter list. */
export interface UsualParametersInput {
  optics: { singleScatteringAlbedo: Bounds; asymmetry: Bounds; source: string };
  transmittance: number;
  method: EstimateInputs['method'];
  shortwaveEfficiencyWm2?: number;
  /** null: longwave off */
  longwaveEfficiencyWm2: number | null;
}

/**
 * The inputs that an ensemble varies by default, with the ranges of the parameter list. Where a run's central value
 * is not the list's, the list's range moves with it, its width unchanged.
 *
 * Bounds of expert ranges are read as 5 to 95 % (normal) or as ends (triangular, beta).
 */
export function usualParameters(input: UsualParametersInput): VariedParameter[] {
  const formula = input.method === 'efficiency' ? [efficiencyParameter(input)] : formulaParameters(input);
  const longwave =
    input.longwaveEfficiencyWm2 === null ? [] : [longwaveParameter(input.longwaveEfficiencyWm2)];
  return [...formula, opticalDepthParameter(), ...longwave].filter(
    (parameter) => parameter.distribution.kind !== 'constant',
  );
}

function formulaParameters({ optics, transmittance }: UsualParametersInput): VariedParameter[] {
  const air = tableRow('T_atm', 'global');
  const ground = tableRow('R_s', 'global mean surface');
  const clouds = tableRow('A_c', 'global annual present');
  return [
    {
      name: 'singleScatteringAlbedo',
      distribution: distributionFromBounds({ kind: 'beta', ...optics.singleScatteringAlbedo }),
      unit: '1',
      source: optics.source,
    },
    {
      name: 'asymmetry',
      distribution: distributionFromBounds({ kind: 'triangular', ...optics.asymmetry }),
      unit: '1',
      source: optics.source,
    },
    {
      name: 'transmittance',
      distribution: distributionFromBounds({ kind: 'triangular', ...within01(moved(air, transmittance)) }),
      unit: '1',
      source: cited(air),
    },
    factorOf('surfaceAlbedoFactor', ground),
    factorOf('cloudFractionFactor', clouds),
  ];
}

/** Range of a global mean as a factor on the map of it. */
function factorOf(name: 'surfaceAlbedoFactor' | 'cloudFractionFactor', row: Parameter): VariedParameter {
  const bounds = { low: row.low / row.central, central: 1, high: row.high / row.central };
  return {
    name,
    distribution: distributionFromBounds({ kind: 'triangular', ...bounds }),
    unit: '1',
    source: cited(row),
  };
}

/** One factor on the whole base field, shared by slice and reference: present-day error and the industrial factor. */
function opticalDepthParameter(): VariedParameter {
  const present = DUST_OPTICAL_DEPTH.find((row) => row.domain === 'global')!;
  const industrial = tableRow('r_PD', 'global');
  const z90 = normalQuantile(0.95); // bounds of r_PD are a 90 % interval
  const relative = [
    present.uncertainty / present.opticalDepth,
    (industrial.high - industrial.low) / 2 / z90 / industrial.central,
  ];
  const lnSd = Math.hypot(...relative);
  return {
    name: 'opticalDepthFactor',
    distribution: { kind: 'lognormal', median: 1, geometricSd: Math.exp(lnSd) },
    unit: '1',
    source: `${present.source}; ${industrial.source}`,
  };
}

function efficiencyParameter({ shortwaveEfficiencyWm2 }: UsualParametersInput): VariedParameter {
  const row = tableRow('E_SW', 'all-sky global mean');
  const bounds = moved(row, shortwaveEfficiencyWm2 ?? row.central);
  return {
    name: 'shortwaveEfficiencyWm2',
    distribution: distributionFromBounds({ kind: 'normal', ...bounds }),
    unit: 'W m⁻²',
    source: cited(row),
  };
}

function longwaveParameter(central: number): VariedParameter {
  const row = tableRow('E_LW', 'all-sky global mean');
  return {
    name: 'longwaveEfficiencyWm2',
    distribution: distributionFromBounds({ kind: 'normal', ...moved(row, central) }),
    unit: 'W m⁻²',
    source: cited(row),
  };
}

/** The list's range about another central value. */
function moved({ low, central, high }: Bounds, to: number): Bounds {
  return { low: low + to - central, central: to, high: high + to - central };
}

/** A range of a share ends where shares end. */
function within01({ low, central, high }: Bounds): Bounds {
  return { low: Math.max(0, low), central, high: Math.min(1, high) };
}

function cited(row: Parameter): string {
  return row.evidence === 'seen' ? row.source : `${row.source} (${row.evidence})`;
}

function tableRow(symbol: string, scope: string): Parameter {
  const row = PARAMETERS.find((parameter) => parameter.symbol === symbol && parameter.scope === scope);
  if (row) return row;
  throw new DomainError('missing-table-row', {
    field: 'parameter',
    value: `${symbol}, ${scope}`,
    allowed: 'a row of the list',
  });
}
