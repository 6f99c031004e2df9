import { DomainError, requireWithin, type Caution } from '../physical/domain-error';

/** Largest particle diameter that a quantity counts [µm]; null: all sizes; undefined: not known. */
export type SizeCutoffUm = number | null | undefined;

export interface SizeCutoffs {
  deposition: SizeCutoffUm;
  lifetime: SizeCutoffUm;
  massExtinction: SizeCutoffUm;
}

const QUANTITIES = ['deposition', 'lifetime', 'massExtinction'] as const;

/**
 * Guards that deposition, lifetime and extinction per mass belong to one size cut-off: dust below 10 µm lives longer
 * and takes out more light per gram than all of it, and mixing two sets errs by a factor of two or more.
 *
 * @param overrideReason why a mismatch is accepted; kept and printed with the result
 * @returns a caution where a cut-off is not known, or where the mismatch was accepted for a reason
 * @throws DomainError `size-cutoff-mismatch` where known cut-offs differ and no reason is given
 *
 * Source: common practice; two consistent sets in the literature are all sizes with 1.9 days and 0.59 m² g⁻¹, and
 * below 10 µm with 4.6 days and 0.72 m² g⁻¹ (the latter from memory).
 */
export function requireOneSizeCutoff(cutoffs: SizeCutoffs, overrideReason?: string): Caution[] {
  for (const quantity of QUANTITIES) {
    const cutoff = cutoffs[quantity];
    if (typeof cutoff === 'number') requireWithin(`sizeCutoff.${quantity}`, cutoff, 'µm', 0.1, 1000);
  }
  const known = QUANTITIES.filter((quantity) => cutoffs[quantity] !== undefined);
  const unknown = QUANTITIES.filter((quantity) => cutoffs[quantity] === undefined);
  const cautions: Caution[] = [];
  if (unknown.length > 0) {
    cautions.push({
      code: 'size-cutoff-unknown',
      message: `The size cut-off of ${unknown.join(', ')} is not known: deposition, lifetime and extinction per mass must share one, or the result may be off by a factor of two.`,
    });
  }
  if (new Set(known.map((quantity) => cutoffs[quantity])).size <= 1) return cautions;
  const told = known.map((quantity) => `${quantity} ${words(cutoffs[quantity]!)}`).join(', ');
  const reason = overrideReason?.trim();
  if (!reason) {
    throw new DomainError('size-cutoff-mismatch', {
      field: 'sizeCutoff',
      value: told,
      allowed: 'one and the same for deposition, lifetime and massExtinction',
      remedy:
        'Choose values of one size cut-off, or give a reason, which is kept and printed with the result.',
    });
  }
  cautions.push({
    code: 'size-cutoff-mismatch-accepted',
    message: `Size cut-offs differ (${told}); accepted for this reason: ${reason}`,
  });
  return cautions;
}

const words = (cutoff: number | null) => (cutoff === null ? 'all sizes' : `below ${cutoff} µm`);
