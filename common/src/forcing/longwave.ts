import { readNumber, refuseUnused } from '../physical/check-fields';
import { STEFAN_BOLTZMANN } from '../physical/constants';
import { DomainError, requireWithin, type Caution } from '../physical/domain-error';
import { readObject } from '../physical/check-fields';

/** Longwave by a published efficiency, for the sky of the result. */
export interface LongwaveEfficiency {
  efficiencyWm2: number;
}

/** Longwave of a thin grey absorbing layer. */
export interface LongwaveGreyLayer {
  /** infrared absorption optical depth, not the one at 550 nm */
  opticalDepth: number;
  surfaceTemperatureK: number;
  layerTemperatureK: number;
  /** 1.66 */
  diffusivity?: number;
  highCloudFraction?: number;
  /** share of the layer's effect that the gases above let through, 1 */
  gasTransmission?: number;
}

export type LongwaveInput = LongwaveEfficiency | LongwaveGreyLayer;

export interface LongwaveTerm {
  longwaveWm2: number;
  cautions: Caution[];
}

export interface GreyLayerFluxes {
  emissivity: number;
  toaWm2: number;
  surfaceWm2: number;
  layerWm2: number;
}

const DIFFUSIVITY = 1.66;
const EFFICIENCY = { field: 'efficiencyWm2', unit: 'W m⁻² per unit τ', min: -1000, max: 1000 } as const;
const GREY = {
  opticalDepth: { field: 'opticalDepth', unit: '', min: 0, max: 10 },
  surfaceTemperatureK: { field: 'surfaceTemperatureK', unit: 'K', min: 100, max: 400 },
  layerTemperatureK: { field: 'layerTemperatureK', unit: 'K', min: 100, max: 400 },
  diffusivity: { field: 'diffusivity', unit: '', min: 1, max: 2, default: DIFFUSIVITY },
  highCloudFraction: { field: 'highCloudFraction', unit: '', min: 0, max: 1, default: 0 },
  gasTransmission: { field: 'gasTransmission', unit: '', min: 0, max: 1, default: 1 },
} as const;

/**
 * A thin grey layer that absorbs and emits above a surface: change of the net downward longwave flux.
 *
 *   ε = 1 − exp(−D τ);  ΔF_TOA = ε_s σT_s⁴ − {[ε_s σT_s⁴ + (1−ε_s) ε σT_d⁴](1−ε) + ε σT_d⁴}
 *
 * which is ε σ(T_s⁴ − T_d⁴) over a black surface: positive when the layer is colder.
 *
 * @param absorptionOpticalDepth τ in the infrared, 0 to 10
 * @param diffusivity D, 1 to 2; 1.66 (Elsasser 1942, from memory) understates the emissivity by 17 % at τ 0.001 and
 * 9 % at 0.1, and overstates it by 4 % at 1; the exact thin limit is 2
 * @param surfaceEmissivity ε_s, 0 to 1
 *
 * Limits: no gases, no scattering, one temperature for the layer.
 * Checked against: checks/optics/longwave_grey_layer.csv.
 */
export function greyLayer(
  absorptionOpticalDepth: number,
  surfaceTemperatureK: number,
  layerTemperatureK: number,
  diffusivity = DIFFUSIVITY,
  surfaceEmissivity = 1,
): GreyLayerFluxes {
  const spec = GREY.opticalDepth;
  requireWithin('opticalDepth', absorptionOpticalDepth, '', spec.min, spec.max);
  requireWithin('surfaceTemperatureK', surfaceTemperatureK, 'K', 100, 400);
  requireWithin('layerTemperatureK', layerTemperatureK, 'K', 100, 400);
  requireWithin('diffusivity', diffusivity, '', 1, 2);
  requireWithin('surfaceEmissivity', surfaceEmissivity, '', 0, 1);
  const emissivity = -Math.expm1(-diffusivity * absorptionOpticalDepth);
  const surface = surfaceEmissivity * STEFAN_BOLTZMANN * surfaceTemperatureK ** 4;
  const layer = emissivity * STEFAN_BOLTZMANN * layerTemperatureK ** 4;
  const upBelow = surface + (1 - surfaceEmissivity) * layer;
  const toaWm2 = surface - (upBelow * (1 - emissivity) + layer);
  const surfaceWm2 = surfaceEmissivity * layer;
  return { emissivity, toaWm2, surfaceWm2, layerWm2: toaWm2 - surfaceWm2 };
}

/**
 * The longwave term of a forcing request: none, by efficiency, or of a grey layer.
 *
 * @param given the request; its `longwave` is read
 * @param opticalDepth τ at 550 nm that an efficiency multiplies; null where the method has none
 * @throws DomainError naming the field within `longwave`
 */
export function longwaveTerm(given: { longwave?: LongwaveInput }, opticalDepth: number | null): LongwaveTerm {
  if (given.longwave === undefined) return { longwaveWm2: 0, cautions: [LEFT_OUT] };
  const block = readObject(given, 'longwave');
  if (!('efficiencyWm2' in block)) return greyTerm(block);
  refuseUnused(block, ['efficiencyWm2'], 'longwave.');
  if (opticalDepth === null) {
    throw new DomainError('unused-input', {
      field: 'longwave.efficiencyWm2',
      value: block.efficiencyWm2,
      allowed: 'left out: this method has no optical depth for it to multiply',
      remedy: 'Describe the grey layer by optical depth and temperatures instead.',
    });
  }
  return {
    longwaveWm2: readNumber(block, EFFICIENCY, 'longwave.') * opticalDepth,
    cautions: [BY_EFFICIENCY],
  };
}

function greyTerm(block: object): LongwaveTerm {
  refuseUnused(block, Object.keys(GREY), 'longwave.');
  const read = (name: keyof typeof GREY) => readNumber(block, GREY[name], 'longwave.');
  const opticalDepth = read('opticalDepth');
  const { toaWm2 } = greyLayer(
    opticalDepth,
    read('surfaceTemperatureK'),
    read('layerTemperatureK'),
    read('diffusivity'),
  );
  const gasTransmission = read('gasTransmission');
  const cautions: Caution[] = [];
  if (gasTransmission === 1) {
    cautions.push({
      code: 'longwave-no-gas-overlap',
      message: 'No gas absorption above and within the layer: the longwave term is an upper bound.',
    });
  }
  if ((block as LongwaveGreyLayer).highCloudFraction === undefined) {
    cautions.push({
      code: 'longwave-clear-of-high-cloud',
      message: 'No high cloud fraction was given: the longwave term is that of a sky without high cloud.',
    });
  }
  return { longwaveWm2: (1 - read('highCloudFraction')) * gasTransmission * toaWm2, cautions };
}

const LEFT_OUT: Caution = {
  code: 'longwave-left-out',
  message:
    'Longwave is left out, which biases the result to cooling: over the tropical Atlantic about 30 % of the shortwave effect of dust is offset.',
};

export const BY_EFFICIENCY: Caution = {
  code: 'longwave-by-efficiency',
  message:
    'A longwave efficiency depends on layer height, surface temperature, water vapour and the coarse share; present-day values may not hold in a colder, drier slice.',
};
