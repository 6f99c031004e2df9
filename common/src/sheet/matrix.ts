import type { DatasetKind } from '../dataset/field';
import { type Axis, isCoordinateProblem, parseCoordinate } from '../units/coordinate';
import { monthOf } from '../units/month';
import { type Claim, unclaimed } from './claim';
import type { ColumnHeading } from './column-headings';
import type { FoundTable } from './find-tables';
import type { RawSheet } from './grid';
import { isFilled, textOf } from './row-kind';

const FEWEST_COLUMNS = 3;

/**
 * A grid as a matrix: the first row holds longitudes (or latitudes), the first column the other axis. Its first row is
 * made of numbers like the others, so no header row was found; this gives it back as header, or null.
 */
export function gridMatrix(sheet: RawSheet, found: FoundTable, kind: DatasetKind): FoundTable | null {
  if (kind.id !== 'gridded-field' || found.headerRows.length > 0 || found.firstRow >= found.lastRow)
    return null;
  const across = axisOfRow(sheet, found);
  if (across === null) return null;
  const down = columnTexts(sheet, found).slice(1);
  const other: Axis = across === 'longitude' ? 'latitude' : 'longitude';
  return isAxis(down, other)
    ? { ...found, headerRows: [found.firstRow], firstRow: found.firstRow + 1 }
    : null;
}

function axisOfRow(sheet: RawSheet, { firstRow }: FoundTable): Axis | null {
  const row = sheet.rows[firstRow - 1] ?? [];
  const corner = textOf(row[0]).trim();
  const texts = row.slice(1).filter(isFilled).map(textOf);
  if (texts.length < FEWEST_COLUMNS || (corner !== '' && /^[-\d.]+$/.test(corner) && Number(corner) !== 0))
    return null;
  if (/^lon[^a-z]*.*lat/i.test(corner)) return isAxis(texts, 'latitude') ? 'latitude' : null;
  if (
    isAxis(texts, 'longitude') &&
    (beyondPoles(texts) ||
      !beyondPoles(columnTexts(sheet, { firstRow: firstRow + 1, lastRow: sheet.rows.length })))
  )
    return 'longitude';
  return isAxis(texts, 'latitude') ? 'latitude' : null;
}

const beyondPoles = (texts: string[]): boolean => texts.some((text) => Math.abs(Number(text)) > 90);

const columnTexts = (
  sheet: RawSheet,
  { firstRow, lastRow }: Pick<FoundTable, 'firstRow' | 'lastRow'>,
): string[] => sheet.rows.slice(firstRow - 1, lastRow).map((row) => textOf(row[0]));

/** Coordinates of one axis in rising or falling order. */
function isAxis(texts: string[], axis: Axis): boolean {
  const filled = texts.filter((text) => text.trim() !== '');
  const values = filled.map((text) => parseCoordinate(text, axis));
  if (filled.length < 2 || values.some(isCoordinateProblem)) return false;
  const plain = filled.map((text) => Number(text)).filter(Number.isFinite);
  const steps = plain.slice(1).map((value, i) => Math.sign(value - plain[i]!));
  return new Set(steps).size <= 1 && !steps.includes(0);
}

/** Claims of the columns of a grid matrix: the axis down, then one column of values for each heading. */
export function claimGridMatrix(headings: ColumnHeading[], sheet: RawSheet, found: FoundTable): Claim[] {
  const texts = headings
    .slice(1)
    .filter(({ text }) => text !== '')
    .map(({ text }) => text);
  const corner = headings[0]?.text ?? '';
  const acrossIsLatitude =
    /^lon[^a-z]*.*lat/i.test(corner) || (isAxis(texts, 'latitude') && beyondPoles(columnTexts(sheet, found)));
  const [down, across] = acrossIsLatitude
    ? (['longitudeDeg', 'latitude'] as const)
    : (['latitudeDeg', 'longitude'] as const);
  const name = nameAbove(sheet, found) ?? 'value';
  return headings.map((heading, i): Claim => {
    if (i === 0)
      return {
        heading: { ...heading, unit: '°' },
        field: down,
        confidence: 0.9,
        reason: `Matrix: the axis down column A.`,
      };
    if (heading.text === '') return unclaimed(heading, 'Empty column.');
    return {
      heading: { ...heading, unit: name === 'value' ? null : unitOfName(sheet, found) },
      field: 'gridValue',
      confidence: 0.85,
      quantity: name,
      reason: `Matrix: the values at ${across} ${heading.text}.`,
    };
  });
}

/** A line of its own above the matrix says what it holds: "Dust deposition (g m-2 yr-1)". */
function titleAbove(sheet: RawSheet, { headerRows }: FoundTable): string | null {
  for (let r = (headerRows[0] ?? 1) - 2; r >= 0; r -= 1) {
    const cells = (sheet.rows[r] ?? []).filter(isFilled);
    if (cells.length === 1 && cells[0]!.text.length <= 80) return cells[0]!.text.trim();
    if (cells.length > 1) return null;
  }
  return null;
}

const nameAbove = (sheet: RawSheet, found: FoundTable): string | null =>
  titleAbove(sheet, found)
    ?.replace(/\s*[([].*$/, '')
    .replace(/^#+\s*/, '') || null;

const unitOfName = (sheet: RawSheet, found: FoundTable): string | null =>
  /[([]([^()[\]]+)[)\]]/.exec(titleAbove(sheet, found) ?? '')?.[1]?.trim() ?? null;

/** Months as headings of a backdrop table: each such column holds the one value the sheet or its title names. */
export function claimMonthMatrix(
  claims: Claim[],
  kind: DatasetKind,
  sheet: RawSheet,
  found: FoundTable,
): Claim[] {
  if (kind.id !== 'backdrop-table') return claims;
  const months = claims.filter(({ field, heading }) => field === null && monthOf(heading.text) !== null);
  if (months.length < FEWEST_COLUMNS) return claims;
  const about = `${titleAbove(sheet, found) ?? ''} ${sheet.name}`;
  const field = /albedo/i.test(about)
    ? 'surfaceAlbedo'
    : /cloud|bew[oö]lk|wolken|nuage|nub/i.test(about)
      ? 'cloudFraction'
      : /temp/i.test(about)
        ? 'temperatureK'
        : null;
  const unit = unitOfName(sheet, found);
  return claims.map((claim) =>
    !months.includes(claim)
      ? claim
      : field === null
        ? {
            ...claim,
            reason:
              'A month; neither sheet nor title says whether it holds albedo, cloud or temperature. Assign it.',
          }
        : {
            ...claim,
            heading: { ...claim.heading, unit: claim.heading.unit ?? unit },
            field,
            confidence: 0.8,
            quantity: field,
            reason: `Matrix: ${field} in the month ${claim.heading.text}.`,
          },
  );
}
