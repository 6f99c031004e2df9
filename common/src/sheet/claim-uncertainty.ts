import type { DatasetKind } from '../dataset/field';
import { parseAgeUnit } from '../units/age';
import { isUnitProblem } from '../units/unit';
import { type Claim, unclaimed } from './claim';
import type { ColumnHeading } from './column-headings';
import type { Uncertainty } from './heading';

/** The field of the uncertainty of a field, null where the kind has none. */
function sigmaFieldOf(field: string | null, kind: DatasetKind): string | null {
  if (field === kind.valueField) return kind.sigmaField;
  return field === null ? null : (kind.sigmas?.[field] ?? null);
}

/** Gives an uncertainty to the value it names, else to the value column on its left, with that column's unit if it has none. */
export function claimUncertainty(
  heading: ColumnHeading,
  uncertainty: Uncertainty,
  before: Claim[],
  kind: DatasetKind,
): Claim {
  const named = uncertainty.baseKey === '' ? undefined : namedClaim(uncertainty.baseKey, before);
  const owner =
    named ?? before.filter((claim) => !claim.uncertainty && claim.reason !== 'Empty column.').at(-1);
  const what = uncertainty.deviation
    ? 'standard deviation'
    : uncertainty.sigmas === 2
      ? 'two standard errors'
      : 'uncertainty';
  const field = owner ? sigmaFieldOf(owner.field, kind) : null;
  if (!owner || field === null) {
    return {
      ...unclaimed(
        heading,
        `The ${what} of ${owner ? `"${owner.heading.text}"` : 'a column'}, which has no field here.`,
      ),
      uncertainty,
    };
  }
  const unit =
    heading.unit !== null && looksCompatible(heading.unit, field) ? heading.unit : owner.heading.unit;
  const taken =
    unit === heading.unit ? '' : ` It has no unit of its own; that of "${owner.heading.text}" is taken.`;
  return {
    heading: { ...heading, unit },
    field,
    confidence: named ? 0.9 : 0.8,
    reason: `The ${what} of "${owner.heading.text}".${taken}`,
    uncertainty,
    ...(owner.quantity ? { quantity: owner.quantity } : {}),
  };
}

const looksCompatible = (unit: string, field: string): boolean =>
  field === 'ageSigmaKa'
    ? !isUnitProblem(parseAgeUnit(unit))
    : field === 'aodSigma' || !/^\d\s*\p{L}$/u.test(unit);

/** The value column that an uncertainty names: "Age error", "Dust flux ± ". */
function namedClaim(baseKey: string, before: Claim[]): Claim | undefined {
  const words = baseKey.split(' ');
  const score = (claim: Claim): number => {
    const own = claim.heading.key.split(' ');
    return words.filter((word) => own.includes(word)).length / Math.max(words.length, own.length);
  };
  const candidates = before.filter((claim) => !claim.uncertainty && claim.heading.key !== '');
  const best = candidates.reduce<Claim | undefined>(
    (top, claim) => (top === undefined || score(claim) >= score(top) ? claim : top),
    undefined,
  );
  return best && score(best) > 0.3 ? best : undefined;
}
