import type { DatasetKind } from '../dataset/field';
import { isDustProxy } from '../dataset/flux-quantity';
import { isRecordKind } from '../dataset/record-kinds';
import type { RawSheet } from './grid';
import { columnLetter } from './grid';
import type { Claim } from './claim';
import { isFilled, textOf } from './row-kind';

/** Settles the claims of one table: each field has one column, apart from tracer fluxes, which stand side by side. */
export function chooseFields(
  claims: Claim[],
  kind: DatasetKind,
  sheet: RawSheet,
  firstHeaderRow: number,
): Claim[] {
  const block = chosenBlock(claims, sheet, firstHeaderRow);
  const inBlock = claims.map((claim) =>
    block && claim.field !== null && (claim.heading.index < block.first || claim.heading.index > block.last)
      ? { ...claim, field: null, reason: block.reason }
      : claim,
  );
  const fluxes = chooseFluxes(inBlock, kind);
  return oneColumnEach(fluxes, kind);
}

const letters = (first: number, last: number): string => `${columnLetter(first)}–${columnLetter(last)}`;

interface Block {
  first: number;
  last: number;
  reason: string;
}

/** Side-by-side blocks, each with an age of its own, are versions of one table: one is taken and the reason said. */
function chosenBlock(claims: Claim[], sheet: RawSheet, firstHeaderRow: number): Block | null {
  const blocks: Claim[][] = [[]];
  for (const claim of claims) {
    if (claim.heading.text === '' && claim.heading.unit === null) blocks.push([]);
    else blocks.at(-1)?.push(claim);
  }
  const aged = blocks.filter((block) => block.some((claim) => claim.field === 'ageKaBp'));
  if (aged.length < 2) return null;
  const above = sheet.rows
    .slice(0, firstHeaderRow - 1)
    .flatMap((row) => row.filter(isFilled).map(textOf))
    .join(' ');
  const revised = /(?:right|rechte?|droite|derecha)[^.]*(?:revis|correct|new|updat|korrigiert|neu)/i.test(
    above,
  );
  const newest = aged.reduce((best, block) => (scaleNumber(block) > scaleNumber(best) ? block : best));
  const [chosen, why] = revised
    ? [aged.at(-1) ?? newest, 'the text above the table calls the right-hand columns revised']
    : [newest, newest === aged[0] ? 'it comes first' : 'its age scale is the newer one'];
  const first = chosen[0]?.heading.index ?? 0;
  const last = chosen.at(-1)?.heading.index ?? first;
  return {
    first,
    last,
    reason: `Several blocks stand side by side; columns ${letters(first, last)} are taken because ${why}. Assign this column to take its block instead.`,
  };
}

/** "EDC3" → 3: number of the age scale in the heading of a block's age. */
function scaleNumber(block: Claim[]): number {
  const age = block.find((claim) => claim.field === 'ageKaBp');
  const found = /\p{Lu}{2,}[\s-]?(\d{1,4})/u.exec(age?.heading.text ?? '');
  return found ? Number(found[1]) : 0;
}

function chooseFluxes(claims: Claim[], kind: DatasetKind): Claim[] {
  if (kind.valueField !== 'fluxGM2Yr') return claims;
  const values = claims.filter((claim) => claim.field === kind.valueField && claim.quantity !== undefined);
  const dust = values
    .filter((claim) => claim.quantity === 'dust')
    .sort((a, b) => b.confidence - a.confidence)[0];
  const kept = new Set(dust ? [dust] : values.filter((claim) => isDustProxy(claim.quantity ?? '')));
  return claims.map((claim) => {
    if (!values.includes(claim) || kept.has(claim)) return claim;
    if (dust)
      return {
        ...claim,
        field: null,
        reason: `${claim.reason.replace(/\.$/, '')}; "${dust.heading.text}" (column ${columnLetter(dust.heading.index)}) is the dust flux.`,
      };
    return {
      ...claim,
      field: null,
      reason: `A flux of ${claim.quantity ?? 'another substance'}, which no estimate of dust is made from.`,
    };
  });
}

/** The best claim keeps a field. An uncertainty keeps its own only while the value it belongs to keeps its. */
function oneColumnEach(claims: Claim[], kind: DatasetKind): Claim[] {
  const severalFluxes =
    claims.filter((claim) => claim.field === kind.valueField && claim.quantity).length > 1;
  const taken = new Map<string, Claim>();
  for (const claim of claims) {
    if (claim.field === null || (severalFluxes && isFluxPart(claim, kind)) || isOfMatrix(claim, kind))
      continue;
    const best = taken.get(claim.field);
    if (!best || claim.confidence > best.confidence) taken.set(claim.field, claim);
  }
  return claims.map((claim) => {
    if (claim.field === null) return claim;
    if (claim.uncertainty && claim.field === kind.sigmaField && !ownerKept(claim, claims, kind)) {
      return {
        ...claim,
        field: null,
        reason: `${claim.reason} That column is not imported, so neither is this one.`,
      };
    }
    const winner = isOfMatrix(claim, kind) ? undefined : taken.get(claim.field);
    if (!winner || winner === claim) return claim;
    return {
      ...claim,
      field: null,
      reason: `${claim.reason} Column ${columnLetter(winner.heading.index)} fits better.`,
    };
  });
}

/** Columns of a matrix all hold the one value, and say so by their quantity. */
const isOfMatrix = (claim: Claim, kind: DatasetKind): boolean =>
  isRecordKind(kind) && claim.quantity !== undefined && !claim.uncertainty;

const isFluxPart = (claim: Claim, kind: DatasetKind): boolean =>
  claim.field === kind.valueField || claim.field === kind.sigmaField;

/** A flux's uncertainty stands to its right, with no other imported or dropped flux of another quantity between. */
function ownerKept(sigma: Claim, claims: Claim[], kind: DatasetKind): boolean {
  return claims.some(
    (claim) => claim.field === kind.valueField && (claim.quantity ?? 'dust') === (sigma.quantity ?? 'dust'),
  );
}
