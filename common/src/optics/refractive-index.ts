import { DomainError, requireWithin, type Caution } from '../physical/domain-error';
import { REFRACTIVE_INDICES, type RefractiveIndexTable } from '../tables/refractive-indices';
import type { RefractiveIndex } from './mie';

export interface IndexAtWavelength {
  refractiveIndex: RefractiveIndex;
  cautions: Caution[];
}

/** Table of a material. @throws DomainError `unknown-choice` with the materials there are */
export function refractiveIndexTable(material: string): RefractiveIndexTable {
  const table = REFRACTIVE_INDICES.find((entry) => entry.id === material);
  if (table) return table;
  throw new DomainError('unknown-choice', {
    field: 'material',
    value: material,
    allowed: REFRACTIVE_INDICES.map((entry) => entry.id),
  });
}

/**
 * Index of a material at a wavelength: n straight over ln λ, k straight as ln k over ln λ (straight in k next to a 0).
 * Between two rows the values stay between those rows, so that nothing overshoots; beyond the table its last row holds,
 * with a caution.
 *
 * @param wavelengthUm 0.1 to 200 µm
 *
 * Limits: absorption bands narrower than the table's steps are cut off.
 * Source: the table's own; the way of interpolating is common practice, no source.
 */
export function refractiveIndexAt(table: RefractiveIndexTable, wavelengthUm: number): IndexAtWavelength {
  requireWithin('wavelengthUm', wavelengthUm, 'µm', 0.1, 200);
  const { wavelengthsUm, real, imaginary } = table;
  const last = wavelengthsUm.length - 1;
  const rowAt = (i: number) => ({ real: real[i]!, imaginary: imaginary[i]! });
  const first = wavelengthsUm[0]!;
  const end = wavelengthsUm[last]!;
  if (wavelengthUm < first || wavelengthUm > end) {
    const refractiveIndex = rowAt(wavelengthUm < first ? 0 : last);
    return { refractiveIndex, cautions: [beyondTable(table, wavelengthUm)] };
  }
  const upper = wavelengthsUm.findIndex((wavelength) => wavelength >= wavelengthUm);
  if (wavelengthsUm[upper] === wavelengthUm) return { refractiveIndex: rowAt(upper), cautions: [] };
  const low = wavelengthsUm[upper - 1]!;
  const share = Math.log(wavelengthUm / low) / Math.log(wavelengthsUm[upper]! / low);
  const [kLow, kHigh] = [imaginary[upper - 1]!, imaginary[upper]!];
  const refractiveIndex = {
    real: real[upper - 1]! + share * (real[upper]! - real[upper - 1]!),
    imaginary: kLow > 0 && kHigh > 0 ? kLow * (kHigh / kLow) ** share : kLow + share * (kHigh - kLow),
  };
  return { refractiveIndex, cautions: [] };
}

function beyondTable({ title, wavelengthsUm }: RefractiveIndexTable, wavelengthUm: number): Caution {
  const first = wavelengthsUm[0]!;
  const last = wavelengthsUm[wavelengthsUm.length - 1]!;
  const extent = first === last ? `the one wavelength ${first} µm` : `${first} to ${last} µm`;
  return {
    code: 'index-extrapolated',
    message: `The index table of ${title.toLowerCase()} covers ${extent}; at ${wavelengthUm} µm its nearest value is used.`,
  };
}
