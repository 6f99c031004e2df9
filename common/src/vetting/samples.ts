import type { DatasetKind } from '../dataset/field';
import { isRecordKind, readableKind } from '../dataset/record-kinds';
import type { SampleRow, TracedValue } from '../dataset/sample-row';
import type { Archive } from './archive';
import type { VettingContext } from './context';
import { groupBy, numberOf } from './place';

/** Words people write for an archive, in the languages the headings come in. */
const ARCHIVE_WORDS: [Archive, RegExp][] = [
  ['ice', /\b(ice|eis|glace|hielo|snow|schnee|firn)|eiskern/i],
  ['loess', /loess|löss|lœss/i],
  ['peat', /peat|torf|moor|tourbe|turba|\bbog\b/i],
  ['lake', /lake|lacustrine|\bsee\b|seesediment|\blac\b|lago/i],
  ['marine', /marine|ocean|deep.?sea|meer|mer\b/i],
];

/** Archive of a row: its own column first, then the form. Null when neither says. */
export function archiveOf(context: VettingContext, row: SampleRow): Archive | null {
  if (row.archive !== null && row.archive.trim() !== '') return archiveOfText(row.archive);
  return context.metadata.archive ?? null;
}

/** Archive that a text names; 'other' when it names none of ours. */
export const archiveOfText = (text: string): Archive =>
  ARCHIVE_WORDS.find(([, words]) => words.test(text))?.[0] ?? 'other';

/** The field that carries the value a dataset is about. */
export const valueField = (context: VettingContext): string => kindOf(context).valueField;

export const kindOf = (context: VettingContext): DatasetKind => readableKind(context.kind ?? 'dust-flux');

/** The row's value: flux [g m⁻² yr⁻¹] or optical depth [1]. */
export const valueOf = (context: VettingContext, row: SampleRow): number | null =>
  numberOf(row, valueField(context));

/**
 * True for a row that says nothing about the quantity: its value cell is empty or holds a missing code.
 * Such a row never enters a version, so its other cells are not held against the file.
 * A cell that could not be read is a fault to mend, not a missing value.
 */
export function isWithoutValue(context: VettingContext, row: SampleRow): boolean {
  const kind = kindOf(context);
  if (isRecordKind(kind))
    return [kind.valueField, ...(kind.usableWith ?? []).flat()].every((field) => isAbsent(row.cells[field]));
  return valueOf(context, row) === null && row.cells[kind.valueField]?.problem === undefined;
}

const isAbsent = (traced: TracedValue | undefined): boolean =>
  traced === undefined || (traced.value === null && traced.problem === undefined);

/** Rows that would enter a version, or would once their value is mended. */
export function countedRows(context: VettingContext): SampleRow[] {
  return context.rows.filter((row) => !isWithoutValue(context, row));
}

/** Site names as compared: case, spaces, hyphens and accents do not matter. */
export function siteKey(name: string): string {
  const plain = /^[ -~]*$/.test(name) ? name : name.normalize('NFKD').replace(/\p{M}/gu, '');
  return plain.toLowerCase().replace(/[\s_\-–.,]+/g, '');
}

/** Rows of one core: same sheet, site and quantity, in the order of the file. */
export function cores(context: VettingContext): SampleRow[][] {
  const rows = context.rows.filter((row) => !isWithoutValue(context, row));
  return [
    ...groupBy(rows, (row) => `${row.sheet}\u0000${siteKey(row.site ?? '')}\u0000${row.quantity}`).values(),
  ];
}

/** Representative depth [m]: the point depth, else the middle of the interval, else what is known of it. */
export function depthOf(row: SampleRow): number | null {
  if (row.depthM !== null) return row.depthM;
  if (row.depthTopM !== null && row.depthBaseM !== null) return (row.depthTopM + row.depthBaseM) / 2;
  return row.depthTopM ?? row.depthBaseM;
}

/** Representative age [ka BP], as `depthOf`. */
export function ageOf(row: SampleRow): number | null {
  if (row.ageKaBp !== null) return row.ageKaBp;
  if (row.ageYoungKaBp !== null && row.ageOldKaBp !== null) return (row.ageYoungKaBp + row.ageOldKaBp) / 2;
  return row.ageYoungKaBp ?? row.ageOldKaBp;
}

/** One place of the file with the rows measured there. */
export interface Site {
  name: string;
  latitudeDeg: number;
  longitudeDeg: number;
  rows: SampleRow[];
}

/** Sites by context: half a dozen rules of one run ask for them. */
const known = new WeakMap<VettingContext, Site[]>();

/** Named positions of the file, in the order they come; the same name at another position is another entry. */
export function sitesOf(context: VettingContext): Site[] {
  const before = known.get(context);
  if (before) return before;
  const sites = findSites(context);
  known.set(context, sites);
  return sites;
}

function findSites(context: VettingContext): Site[] {
  const sites = new Map<string, Site>();
  for (const row of countedRows(context)) {
    const { site, latitudeDeg, longitudeDeg } = row;
    if (site === null || latitudeDeg === null || longitudeDeg === null) continue;
    const key = `${siteKey(site)}\u0000${latitudeDeg}\u0000${longitudeDeg}`;
    const known = sites.get(key);
    if (known) known.rows.push(row);
    else sites.set(key, { name: site, latitudeDeg, longitudeDeg, rows: [row] });
  }
  return [...sites.values()];
}
