import type { DatasetKind, FieldDeclaration } from '../dataset/field';
import { fluxQuantityOf } from '../dataset/flux-quantity';
import { isRecordKind } from '../dataset/record-kinds';
import { parseAgeUnit } from '../units/age';
import { convertTo, UNIT_KINDS, type UnitKind } from '../units/convert';
import { isUnitProblem } from '../units/unit';
import type { ColumnHeading } from './column-headings';
import { wavelengthNmIn } from './wavelength-in-heading';
import { type Claim, unclaimed } from './claim';
import { claimUncertainty } from './claim-uncertainty';
import { uncertaintyOf } from './heading';

/** Share of a column's filled cells that read as numbers; undefined for an empty column. */
export type NumberShare = (index: number) => number | undefined;

/**
 * Recognises columns by heading, unit and values. Uncertainties go to the value on their left;
 * tracer fluxes and concentrations are named for what they are, never taken for dust.
 */
export function recogniseColumns(
  headings: ColumnHeading[],
  kind: DatasetKind,
  numberShare: NumberShare,
): Claim[] {
  const claims: Claim[] = [];
  for (const heading of headings) {
    const uncertainty = uncertaintyOf(heading);
    claims.push(
      uncertainty
        ? claimUncertainty(heading, uncertainty, claims, kind)
        : claimValue(heading, kind, numberShare),
    );
  }
  return claims;
}

function claimValue(heading: ColumnHeading, kind: DatasetKind, numberShare: NumberShare): Claim {
  const share = numberShare(heading.index);
  if (heading.text === '' && heading.unit === null)
    return unclaimed(heading, share === undefined ? 'Empty column.' : 'The column has no heading.');
  if (isRecordKind(kind)) return claimOfRecord(heading, kind, share);
  const tracer = fluxQuantityOf(heading.text);
  const isTracer = tracer !== null && tracer !== 'dust';
  const claims = likely(heading, kind, share);
  if (isTracer) {
    const asTracer = claimTracer(heading, tracer, kind);
    if (asTracer) return asTracer;
  }
  const best = claims[0];
  if (!best) return byUnitAlone(heading, kind, share);
  if (best.field.field === 'aod') best.score *= wavelengthWeight(heading.text, share);
  const claim: Claim = {
    heading,
    field: best.field.field,
    confidence: Math.round(best.score * 100) / 100,
    reason: best.reason,
  };
  return best.field.quantity === 'massFlux' && best.field.field === kind.valueField
    ? { ...claim, quantity: tracer ?? 'dust' }
    : claim;
}

interface Likely {
  field: FieldDeclaration;
  score: number;
  reason: string;
}

/** Fields that a heading and its unit may mean, best first. Uncertainties are claimed elsewhere. */
function likely(heading: ColumnHeading, kind: DatasetKind, share: number | undefined): Likely[] {
  const sigmas = new Set([kind.sigmaField, ...Object.values(kind.sigmas ?? {})]);
  return kind.fields
    .filter(({ field }) => !sigmas.has(field) || (field === 'ageSigmaKa' && kind.id === 'age-series'))
    .map((field) => ({ field, ...likeness(heading, field, share) }))
    .filter(({ score }) => score >= 0.3)
    .sort((a, b) => b.score - a.score);
}

/**
 * A column of a kind of records. A value that keeps its own unit is named by its heading: known by the whole heading,
 * or by nothing but having a unit and numbers; a part of a heading without unit is too little.
 */
function claimOfRecord(heading: ColumnHeading, kind: DatasetKind, share: number | undefined): Claim {
  const best = likely(heading, kind, share).find(
    ({ field, score }) => field.quantity !== 'asGiven' || heading.unit !== null || score >= 0.9,
  );
  const value = kind.fields.find(({ field }) => field === kind.valueField);
  const named = value?.quantity === 'asGiven' ? { quantity: heading.name || heading.text } : {};
  if (best) {
    const { field, score, reason } = best;
    const own = field === value ? named : {};
    return { heading, field: field.field, confidence: Math.round(score * 100) / 100, reason, ...own };
  }
  if (value?.quantity !== 'asGiven' || heading.unit === null || (share ?? 0) < 0.3)
    return unclaimed(heading, 'No field of this kind is headed so.');
  const age = parseAgeUnit(heading.unit);
  if (!isUnitProblem(age) && age.datum !== null && kind.fields.some(({ field }) => field === 'ageKaBp'))
    return {
      heading,
      field: 'ageKaBp',
      confidence: 0.6,
      reason: `Only an age has the unit ${heading.unit}.`,
    };
  const reason = `A column of numbers with the unit ${heading.unit}.`;
  return { heading, field: value.field, confidence: 0.5, reason, ...named };
}

/** Of several wavelengths the one with values and nearest to 550 nm is taken, for there optical depths are compared. */
function wavelengthWeight(heading: string, share: number | undefined): number {
  const wavelength = wavelengthNmIn(heading);
  const nearness = wavelength === null ? 1 : 1 - Math.min(0.3, Math.abs(wavelength - 550) / 5000);
  return nearness * (share === undefined ? 0.5 : 1);
}

/** A flux or concentration of calcium, iron … : kept under its own name, imported only where no dust flux is given. */
function claimTracer(heading: ColumnHeading, tracer: string, kind: DatasetKind): Claim | null {
  const isFlux =
    /flux|fluss|flujo|flusso|(?<!\p{L})mar(?!\p{L})|deposition/iu.test(heading.text) ||
    fits('massFlux', heading.unit);
  if (isFlux && kind.valueField === 'fluxGM2Yr') {
    return {
      heading,
      field: kind.valueField,
      confidence: 0.5,
      quantity: tracer,
      reason: `A flux of ${tracer}: a tracer, not dust.`,
    };
  }
  if (fits('concentration', heading.unit) || heading.unit === null) {
    const declared = kind.fields.find(
      (field) => field.headings.includes(heading.key) && field.quantity === 'massFraction',
    );
    return declared ? null : unclaimed(heading, `A concentration of ${tracer}, not a flux of dust.`, 0.8);
  }
  return null;
}

const fits = (kind: UnitKind, unit: string | null): boolean =>
  unit !== null && !isUnitProblem(convertTo(kind, unit));

/** How well a heading and its unit fit a field: 0 to 1. */
function likeness(
  heading: ColumnHeading,
  field: FieldDeclaration,
  share: number | undefined,
): { score: number; reason: string } {
  const [byWords, how] = wordLikeness(heading.key, field.headings);
  if (byWords === 0) return { score: 0, reason: '' };
  const unit = unitFit(heading, field);
  if (field.quantity === 'text') {
    const isNumeric = share !== undefined && share > 0.8 && !/^(?:sample|probe|id|bag|lab)/.test(heading.key);
    return { score: byWords * (isNumeric && field.field !== 'remark' ? 0.4 : 1), reason: how };
  }
  const numeric =
    share === undefined || share >= 0.3 || field.quantity === 'latitude' || field.quantity === 'longitude';
  const score = byWords * unit.weight * (numeric ? 1 : 0.4);
  return { score, reason: unit.reason === '' ? how : `${how.replace(/\.$/, '')}; ${unit.reason}` };
}

function wordLikeness(key: string, headings: string[]): [number, string] {
  if (key === '') return [0, ''];
  if (headings.includes(key)) return [0.95, `The heading is "${key}".`];
  const words = key.split(' ');
  let best: [number, string] = [0, ''];
  for (const synonym of headings) {
    const wanted = synonym.split(' ');
    if (!wanted.every((word) => words.includes(word))) continue;
    const score = 0.55 + 0.35 * (wanted.length / words.length) ** 0.5 * (wanted.length > 1 ? 1 : 0.75);
    if (score > best[0] && (wanted.length > 1 || words.length <= 4) && synonym.length > 1)
      best = [score, `The heading holds "${synonym}".`];
  }
  return best;
}

function unitFit(
  heading: ColumnHeading,
  { quantity, canonicalUnit }: FieldDeclaration,
): { weight: number; reason: string } {
  if (quantity === 'text' || quantity === 'month' || quantity === 'asGiven') return { weight: 1, reason: '' };
  if (quantity === 'count')
    return heading.unit === null
      ? { weight: 1, reason: '' }
      : { weight: 0.5, reason: `a count with the unit ${heading.unit}.` };
  if (quantity === 'age') {
    const age = parseAgeUnit(heading.unit ?? '', heading.text);
    return isUnitProblem(age)
      ? { weight: 0.6, reason: 'no unit of an age is given.' }
      : { weight: 1, reason: `the unit ${age.text} is one of an age.` };
  }
  const kind = quantity === 'latitude' || quantity === 'longitude' ? 'angle' : quantity;
  if (heading.unit === null)
    return { weight: kind === 'angle' || UNIT_KINDS[kind].canonical === '1' ? 1 : 0.8, reason: '' };
  return fits(kind, heading.unit)
    ? { weight: 1.04, reason: `the unit ${heading.unit} converts to ${canonicalUnit}.` }
    : { weight: 0.45, reason: `but the unit ${heading.unit} does not convert to ${canonicalUnit}.` };
}

/** No heading that is known, but a unit that only one field can have. */
function byUnitAlone(heading: ColumnHeading, kind: DatasetKind, share: number | undefined): Claim {
  const { unit } = heading;
  if (unit === null || (share ?? 0) < 0.3) return unclaimed(heading, 'No field of this kind is headed so.');
  const age = parseAgeUnit(unit);
  if (!isUnitProblem(age) && age.datum !== null && kind.fields.some((field) => field.field === 'ageKaBp')) {
    return { heading, field: 'ageKaBp', confidence: 0.6, reason: `Only an age has the unit ${unit}.` };
  }
  const names = fluxQuantityOf(heading.text);
  if (names === 'dust' && fits('massFlux', unit) && kind.valueField === 'fluxGM2Yr') {
    return {
      heading,
      field: kind.valueField,
      confidence: 0.75,
      quantity: 'dust',
      reason: `It names dust and has the unit of a flux, ${unit}.`,
    };
  }
  return unclaimed(heading, 'No field of this kind is headed so.');
}
