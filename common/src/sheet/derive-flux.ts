import type { SampleRow } from '../dataset/sample-row';

/** 1 ng g⁻¹ × 1 kg m⁻² yr⁻¹ = 1e-6 g m⁻² yr⁻¹. */
const NG_G_TIMES_KG = 1e-6;
/** 1 g cm⁻³ × 1 cm kyr⁻¹ = 1 g cm⁻² kyr⁻¹ = 10 g m⁻² yr⁻¹. */
const G_CM3_TIMES_CM_KYR = 10;

/**
 * Dust flux [g m⁻² yr⁻¹] of a row that gives what it is made of instead: concentration × accumulation in ice,
 * or dry bulk density × sedimentation rate × dust fraction in sediment. The rule says so; its cell is null.
 * Leaves the row alone when a part is missing: a concentration without accumulation is no flux.
 */
export function deriveFlux(sample: SampleRow): void {
  const { concentrationNgG, accumulationKgM2Yr, densityGCm3, sedimentationRateCmKyr, dustFraction } = sample;
  if (concentrationNgG !== null && accumulationKgM2Yr !== null) {
    put(sample, concentrationNgG * accumulationKgM2Yr * NG_G_TIMES_KG, 'concentration × accumulation × 1e-6');
  } else if (densityGCm3 !== null && sedimentationRateCmKyr !== null && dustFraction !== null) {
    put(
      sample,
      densityGCm3 * sedimentationRateCmKyr * dustFraction * G_CM3_TIMES_CM_KYR,
      'dry bulk density × sedimentation rate × dust fraction × 10',
    );
  }
}

function put(sample: SampleRow, product: number, rule: string): void {
  const value = Number(product.toPrecision(12));
  sample.fluxGM2Yr = value;
  sample.cells.fluxGM2Yr = { cell: null, raw: '', value, unit: 'g m-2 yr-1', rule };
}
