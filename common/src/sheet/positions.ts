import type { DatasetKind } from '../dataset/field';
import { type Axis, isCoordinateProblem, parseCoordinate } from '../units/coordinate';
import { cellAddress, type RawSheet, type RawWorkbook } from './grid';
import { headingKey, splitHeading } from './heading';
import type { TableConstant } from './mapping';
import { isFilled, textOf } from './row-kind';

/** Fields that people write once above the table instead of in a column. */
const CONSTANT_FIELDS = ['site', 'latitudeDeg', 'longitudeDeg', 'elevationM', 'waterDepthM'];
/** Rows counted from 1, `before` not among them. */
export interface RowSpan {
  from: number;
  before: number;
}

const AXES: Record<string, Axis> = { latitudeDeg: 'latitude', longitudeDeg: 'longitude' };

/**
 * Values that hold for a whole table, found as label and value in the rows above it ("Latitude | 75°06'S",
 * "lat | 75.1", "Elevation (m) | 3233", "Lat: 75.1 S"), or as a position in running text.
 */
export function constantsAbove(sheet: RawSheet, rows: RowSpan, kind: DatasetKind): TableConstant[] {
  const found = new Map<string, TableConstant>();
  for (let r = rows.from - 1; r < Math.min(rows.before - 1, sheet.rows.length); r += 1) {
    const row = sheet.rows[r] ?? [];
    for (const [c, cell] of row.entries()) {
      if (!isFilled(cell)) continue;
      for (const constant of [
        labelled(sheet, kind, r, c),
        ...inOneCell(sheet, r, c),
        ...inText(sheet, r, c),
      ]) {
        if (constant && !found.has(constant.field)) found.set(constant.field, constant);
      }
    }
  }
  return [...found.values()];
}

function labelled(sheet: RawSheet, kind: DatasetKind, r: number, c: number): TableConstant | null {
  const heading = splitHeading(textOf(sheet.rows[r]?.[c]).replace(/[:=]\s*$/, ''));
  const field = kind.fields.find(
    (one) => CONSTANT_FIELDS.includes(one.field) && one.headings.includes(heading.key),
  );
  if (!field) return null;
  const right = nextFilled(sheet, r, c);
  if (right === null) return null;
  const text = textOf(sheet.rows[r]?.[right]).trim();
  const axis = AXES[field.field];
  const isValue = axis
    ? !isCoordinateProblem(parseCoordinate(text, axis))
    : field.quantity === 'text'
      ? !/^\W*$/.test(text)
      : /^[-−+]?\d/.test(text);
  if (!isValue) return null;
  const unit = axis ? '°' : field.quantity === 'text' ? null : (heading.unit ?? field.canonicalUnit);
  return constant(
    sheet,
    field.field,
    text,
    unit,
    cellAddress(right, r + 1),
    `Beside "${heading.text}" above the table.`,
  );
}

function nextFilled(sheet: RawSheet, r: number, c: number): number | null {
  const row = sheet.rows[r] ?? [];
  for (let i = c + 1; i < Math.min(row.length, c + 4); i += 1) if (isFilled(row[i])) return i;
  return null;
}

/** "Latitude: 75°06'S", "lat = -75.1, lon = 123.35" within one cell. */
function inOneCell(sheet: RawSheet, r: number, c: number): (TableConstant | null)[] {
  const text = textOf(sheet.rows[r]?.[c]);
  return (['latitude', 'longitude'] as const).map((axis) => {
    const words = axis === 'latitude' ? 'lat(?:itude)?|breite|latitud' : 'lon(?:g|gitude)?|l[äa]nge|longitud';
    const value = new RegExp(`(?<!\\p{L})(?:${words})\\.?\\s*[:=]\\s*([-−+]?\\d[^;,|]*)`, 'iu')
      .exec(text)?.[1]
      ?.trim();
    if (value === undefined || isCoordinateProblem(parseCoordinate(value, axis))) return null;
    const field = axis === 'latitude' ? 'latitudeDeg' : 'longitudeDeg';
    return constant(sheet, field, value, '°', cellAddress(c, r + 1), 'Named in a line above the table.');
  });
}

const DEGREES = String.raw`\d{1,3}(?:[.,]\d+)?(?:\s?[^\p{L}\p{N}\s.,;]\s?(?:\d{1,2}(?:[.,]\d+)?\s?['’′]?\s?(?:\d{1,2}(?:[.,]\d+)?\s?["”″])?)?)?`;
const PAIR = new RegExp(
  String.raw`(?<![\d.,])(${DEGREES}\s?[NS])(?!\p{L})[\s,;/]+(${DEGREES}\s?[EW])(?!\p{L})`,
  'u',
);

function inText(sheet: RawSheet, r: number, c: number): TableConstant[] {
  const pair = positionInText(textOf(sheet.rows[r]?.[c]));
  if (!pair) return [];
  const cell = cellAddress(c, r + 1);
  const elevation =
    /(?<![\d.,])(-?\d{1,4}(?:\.\d+)?)\s?m(?:etres|eters)?\s(?:above sea level|a\.?\s?s\.?\s?l)/i.exec(
      textOf(sheet.rows[r]?.[c]),
    )?.[1];
  const height =
    elevation === undefined
      ? []
      : [constant(sheet, 'elevationM', elevation, 'm', cell, 'Named in a line above the table.')];
  return [
    ...height,
    constant(sheet, 'latitudeDeg', pair[0], '°', cell, 'Named in a line above the table.'),
    constant(sheet, 'longitudeDeg', pair[1], '°', cell, 'Named in a line above the table.'),
  ];
}

function positionInText(text: string): [string, string] | null {
  const found = PAIR.exec(text);
  if (!found) return null;
  // A degree sign lost in decoding is put back: any sign between degrees and minutes stands for it.
  const [latitude, longitude] = [found[1] ?? '', found[2] ?? ''].map((part) =>
    part.replace(/^(\d+)\s?[^\p{L}\p{N}\s.,;]/u, '$1°'),
  );
  if (latitude === undefined || longitude === undefined) return null;
  const readable =
    !isCoordinateProblem(parseCoordinate(latitude, 'latitude')) &&
    !isCoordinateProblem(parseCoordinate(longitude, 'longitude'));
  return readable ? [latitude, longitude] : null;
}

/** The one position named in the notes sheets of a workbook; none when they name two different ones. */
export function positionInNotes(
  workbook: RawWorkbook,
  isNotes: (sheet: RawSheet) => boolean,
): { pair: [string, string]; sheet: string } | null {
  const found: { pair: [string, string]; sheet: string }[] = [];
  for (const sheet of workbook.sheets.filter(isNotes)) {
    for (const cell of sheet.rows.flat()) {
      const pair = isFilled(cell) ? positionInText(cell.text) : null;
      if (pair && !found.some((other) => other.pair.join() === pair.join()))
        found.push({ pair, sheet: sheet.name });
    }
  }
  return found.length === 1 ? (found[0] ?? null) : null;
}

function constant(
  sheet: RawSheet,
  field: string,
  text: string,
  unit: string | null,
  cell: string | null,
  reason: string,
): TableConstant {
  return { sheet: sheet.name, field, text, unit, cell, reason };
}

const GENERIC_SHEET =
  /^(?:sheet|tabelle|feuil|hoja|foglio|blad|planilha|table|tab|data|daten|dataset|results?|export|flux(?:es)?|dust|values|raw|by ?(?:age|depth)|ages?|depths?|final|all)[\s_-]*\d*$/i;

/**
 * Site name where no column has it: the sheet's own name unless that is a general word, else the beginning of the
 * title above the table ("EPICA Dome C, dust flux …" → "EPICA Dome C").
 */
export function siteName(sheet: RawSheet, rows: RowSpan, isText: boolean): TableConstant | null {
  const title = titleAbove(sheet, rows);
  const isGeneral = GENERIC_SHEET.test(sheet.name.replace(/([a-z])([A-Z])/g, '$1 $2'));
  if (!isText && !isGeneral) {
    return constant(
      sheet,
      'site',
      sheet.name,
      null,
      null,
      'The name of the sheet; change it if the site has another name.',
    );
  }
  if (title === null) return null;
  return constant(
    sheet,
    'site',
    title.site,
    null,
    title.cell,
    'The beginning of the title above the table; change it if the site has another name.',
  );
}

function titleAbove(sheet: RawSheet, rows: RowSpan): { site: string; cell: string } | null {
  for (let r = rows.from - 1; r < Math.min(rows.before - 1, sheet.rows.length); r += 1) {
    const c = (sheet.rows[r] ?? []).findIndex(isFilled);
    if (c < 0) continue;
    const text = textOf(sheet.rows[r]?.[c]).replace(/^#+\s*/, '');
    const site =
      text
        .split(
          /[,:;(|]|\s[-–]\s|\s(?:dust|chemistry|data|ice core|core|record|flux|calcium|ionic)(?!\p{L})/iu,
        )[0]
        ?.trim() ?? '';
    return site !== '' && site.length <= 40 && headingKey(site) !== ''
      ? { site, cell: cellAddress(c, r + 1) }
      : null;
  }
  return null;
}
