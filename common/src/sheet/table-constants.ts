import { type DatasetKind, fieldOf } from '../dataset/field';
import type { Draft } from './assemble-mapping';
import type { RawSheet, RawWorkbook } from './grid';
import type { TableConstant } from './mapping';
import { constantsAbove, type positionInNotes, type RowSpan, siteName } from './positions';
import { wavelengthConstant } from './wavelength-in-heading';

/**
 * What holds for every row of a table though no column has it: positions and names above the table, else those above
 * the first table of its sheet, else the sheet's name or title, else the one position in the notes.
 */
export function tableConstants(
  draft: Draft,
  workbook: RawWorkbook,
  kind: DatasetKind,
  notes: ReturnType<typeof positionInNotes>,
): TableConstant[] {
  const sheet = workbook.sheets.find((one) => one.name === draft.table.sheet);
  if (!sheet || !draft.span) return [];
  const mapped = new Set(draft.claims.map((claim) => claim.field));
  const offered = draft.block
    ? [...draft.block.constants]
    : statedConstants(sheet, draft.span, draft.general, kind);
  const has = (field: string): boolean =>
    mapped.has(field) || offered.some((constant) => constant.field === field);
  if (!has('site') && fieldOf(kind, 'site')?.required) {
    const site = nameOf(draft, draft.span, sheet, ['csv', 'tsv', 'txt'].includes(workbook.format), kind);
    if (site) offered.push(site);
  }
  if (notes && !has('latitudeDeg') && !has('longitudeDeg')) {
    const named = {
      sheet: sheet.name,
      unit: '°',
      cell: null,
      reason: `The one position named in the notes of sheet "${notes.sheet}".`,
    };
    offered.push(
      { ...named, field: 'latitudeDeg', text: notes.pair[0] },
      { ...named, field: 'longitudeDeg', text: notes.pair[1] },
    );
  }
  if (kind.valueField === 'aod' && !has('wavelengthNm')) {
    const value = draft.claims.find((claim) => claim.field === 'aod');
    const wavelength = value ? wavelengthConstant(value.heading, draft.table) : null;
    if (wavelength) offered.push(wavelength);
  }
  return offered.filter(({ field }) => !mapped.has(field) && fieldOf(kind, field) !== undefined);
}

/** The title above the table, unless the position comes from above the first one: then its title names the site. */
function nameOf(
  { general }: Draft,
  span: RowSpan,
  sheet: RawSheet,
  isText: boolean,
  kind: DatasetKind,
): TableConstant | null {
  const isPlaced = (rows: RowSpan): boolean =>
    constantsAbove(sheet, rows, kind).some(({ field }) => field === 'latitudeDeg');
  const placedAbove = general !== null && isPlaced(general) && !isPlaced(span);
  return siteName(sheet, placedAbove ? general : span, isText);
}

/** What stands above the first table of a sheet holds for the later ones too, unless they say otherwise. */
function statedConstants(
  sheet: RawSheet,
  span: RowSpan,
  above: RowSpan | null,
  kind: DatasetKind,
): TableConstant[] {
  const own = constantsAbove(sheet, span, kind);
  if (!above) return own;
  const general = constantsAbove(sheet, above, kind);
  return [...own, ...general.filter((one) => !own.some((other) => other.field === one.field))];
}
