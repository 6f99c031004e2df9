import { fieldOf } from '@siltlight/common/dataset/field';
import { datasetKind } from '@siltlight/common/dataset/kinds';
import type { SubmissionDetail } from '@siltlight/common/wire/submissions';

export type GridColumn = {
  letter: string;
  heading: string;
  /** null: a column that is not imported */
  title: string | null;
  unit: string | null;
  canonicalUnit: string;
  numeric: boolean;
  widthPx: number;
};

const FIRST_ON_NARROW = ['site', 'ageKaBp'];

/** Columns of a sheet under the mapping; on a narrow screen site, age and value come first, the rest is scrolled to. */
export function gridColumns(
  { kind, mapping }: Pick<SubmissionDetail, 'kind' | 'mapping'>,
  sheet: string,
  letters: readonly string[],
  narrow: boolean,
): GridColumn[] {
  const declared = datasetKind(kind);
  const mapped = new Map(
    mapping.columns.filter((column) => column.sheet === sheet).map((column) => [column.column, column]),
  );
  const columns = letters.map((letter) => {
    const column = mapped.get(letter);
    const field = column?.field ? fieldOf(declared, column.field) : undefined;
    return {
      field: field?.field,
      letter,
      heading: column?.heading ?? '',
      title: field?.title ?? null,
      unit: column?.unit ?? null,
      canonicalUnit: field?.canonicalUnit ?? '',
      numeric: field !== undefined && field.quantity !== 'text',
      widthPx: widthOf(
        column?.heading ?? '',
        field?.title,
        unitsText(column?.unit, field?.canonicalUnit),
        narrow,
      ),
    };
  });
  const first = narrow ? [...FIRST_ON_NARROW, declared.valueField] : [];
  const rank = (field: string | undefined) => {
    const at = field === undefined ? -1 : first.indexOf(field);
    return at < 0 ? first.length : at;
  };
  return columns
    .map((column, at) => ({ column, at }))
    .sort((a, b) => rank(a.column.field) - rank(b.column.field) || a.at - b.at)
    .map(({ column: { field: _, ...column } }) => column);
}

const unitsText = (unit: string | null | undefined, canonical = '') =>
  !unit || unit === canonical ? canonical : `${unit} to ${canonical}`;

const CHAR_PX = 5.7;
const AIR_PX = 26;

/** Wide enough for the title and, as far as that is short, for heading and units beneath it. */
function widthOf(heading: string, title: string | undefined, units: string, narrow: boolean): number {
  if (title === undefined)
    return narrow ? 84 : Math.min(140, Math.max(84, heading.length * CHAR_PX + AIR_PX));
  const beneath = (heading.length + units.length + 3) * CHAR_PX + AIR_PX;
  const wanted = Math.max(title.length * 7 + 20, Math.min(beneath, 210));
  return Math.round(Math.min(narrow ? 128 : 210, Math.max(88, wanted)));
}
