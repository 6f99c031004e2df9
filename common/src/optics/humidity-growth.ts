import { readNumber, refuseUnused } from '../physical/check-fields';
import { requireWithin, type Caution } from '../physical/domain-error';

export interface HumidityGrowthRequest {
  kappa: number;
  relativeHumidity: number;
}

export interface HumidityGrowthAnswer {
  diameterGrowthFactor: number;
  cautions: Caution[];
  method: { name: string; source: string };
}

/**
 * Growth of a particle's diameter by water uptake, without the curvature term:
 *
 *   D/D_dry = (1 + κ a/(1 − a))^(1/3),  a = relative humidity
 *
 * @param kappa hygroscopicity κ [1], 0 to 2
 * @param relativeHumidity as a fraction, 0 to 0.99
 *
 * Limits: well-mixed particles below saturation, no crystallisation. At 90 % humidity the curvature term lowers the
 * factor by about 3 % at 100 nm dry diameter, 0.3 % at 1 µm (ammonium sulfate).
 * Source: Petters & Kreidenweis (2007), Atmos. Chem. Phys. 7, 1961–1971.
 * Checked against: checks/general/kappa_koehler_growth.csv, column growth_factor_no_kelvin.
 */
export function diameterGrowthFactor(kappa: number, relativeHumidity: number): number {
  requireWithin('kappa', kappa, '', 0, 2);
  requireWithin('relativeHumidity', relativeHumidity, '', 0, 0.99);
  return Math.cbrt(1 + (kappa * relativeHumidity) / (1 - relativeHumidity));
}

export function calculateHumidityGrowth(request: HumidityGrowthRequest): HumidityGrowthAnswer {
  refuseUnused(request, ['kappa', 'relativeHumidity']);
  const kappa = readNumber(request, { field: 'kappa', unit: '', min: 0, max: 2 });
  const humidity = readNumber(request, { field: 'relativeHumidity', unit: '', min: 0, max: 0.99 });
  const cautions: Caution[] =
    humidity > 0.9
      ? [
          {
            code: 'humidity-near-saturation',
            message:
              'Growth by κ holds for well-mixed particles below about 95 % relative humidity; above 90 % it rises steeply.',
          },
        ]
      : [];
  return {
    diameterGrowthFactor: diameterGrowthFactor(kappa, humidity),
    cautions,
    method: {
      name: 'κ-Köhler without curvature',
      source: 'Petters & Kreidenweis (2007), Atmos. Chem. Phys. 7, 1961–1971',
    },
  };
}
