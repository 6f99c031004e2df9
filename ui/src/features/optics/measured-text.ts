import { readNumberText } from '../../shared/form/number-text';
import { measuredColumns, readMeasured, type MeasuredForm } from './measured-form';

/** What is wrong in a pasted block; `row` counts the lines of the text from 1, the heading among them. */
export type TextFault = { row: number; column: string; value: string; message: string };
export type ReadText = { rows: string[][]; unused: string[] } | { faults: TextFault[] };

type Role = { first: number; bound: 'low' | 'central' | 'high'; factor: number };
type Line = { row: number; cells: string[] };

/** Column of the form where each quantity begins; low, central and high follow each other but for the wavelength. */
const quantities: readonly { first: number; name: string; test: RegExp }[] = [
  { first: 0, name: 'wavelength', test: /^(wavelength|wave length|lambda|λ|wl)\b|^λ/ },
  { first: 1, name: 'extinction', test: /^(mass )?extinction\b|^mee\b|^mec\b/ },
  { first: 4, name: 'ω', test: /^(ω|omega|ssa\b|(single[- ]scattering )?albedo\b)/ },
  { first: 7, name: 'g', test: /^(g|asymmetry)(?![a-z])/ },
];
const wavelengthUnits: Readonly<Record<string, number>> = { nm: 1e-3, µm: 1, um: 1, micron: 1, microns: 1 };
const massUnits = new Set(['', 'm2/g', 'm2g-1', 'm2g^-1']);

/**
 * Reads wavelength, extinction, ω and g of a block with a heading row: columns apart by tab, semicolon or comma, decimal
 * point or comma, lines of # left out. Where low and high have no column, they are the value itself.
 */
export function readMeasuredText(text: string): ReadText {
  const lines = text
    .replace(/^\uFEFF/, '')
    .split(/\r\n|\r|\n/)
    .map((line, at) => ({ row: at + 1, line }))
    .filter(({ line }) => line.trim() !== '' && !line.trimStart().startsWith('#'));
  const [head, ...body] = lines;
  if (!head || body.length === 0) {
    return one(head?.row ?? 1, '', '', 'Give a heading row and at least one row of values below it.');
  }
  const mark = ['\t', ';', ','].find((sign) => head.line.includes(sign));
  if (!mark) {
    return one(head.row, '', head.line, 'No columns are seen. Part them by tab, semicolon or comma.');
  }
  const split = (line: string) =>
    line.split(mark).map((cell) =>
      cell
        .trim()
        .replace(/^"(.*)"$/, '$1')
        .trim(),
    );
  const headings = split(head.line);
  const roles = readHeadings(headings, head.row);
  if ('faults' in roles) return roles;
  const table = body.map(({ row, line }): Line => ({ row, cells: split(line) }));
  return readLines(table, headings, roles.roles, mark);
}

const one = (row: number, column: string, value: string, message: string) => ({
  faults: [{ row, column, value, message }],
});

function readHeadings(
  headings: readonly string[],
  row: number,
): { roles: (Role | null)[] } | { faults: TextFault[] } {
  const faults: TextFault[] = [];
  const fault = (value: string, message: string) => faults.push({ row, column: value, value, message });
  const roles = headings.map((heading): Role | null => {
    const plain = heading.toLowerCase().replace(/_/g, ' ').replace(/μ/g, 'µ').trim();
    const quantity = quantities.find(({ test }) => test.test(plain));
    if (!quantity) return null;
    const bound = plain.match(/\b(low|high)\b/)?.[1] as 'low' | 'high' | undefined;
    const factor = factorOf(plain, quantity.first);
    if (factor === null) {
      fault(
        heading,
        `The unit cannot be used. ${quantity.first === 0 ? 'Write µm or nm, as “wavelength (nm)”.' : 'Give extinction in m²/g.'}`,
      );
    }
    return { first: quantity.first, bound: bound ?? 'central', factor: factor ?? 1 };
  });
  for (const { first, name } of quantities) {
    const own = roles.filter((role) => role?.first === first);
    if (!own.some((role) => role?.bound === 'central')) {
      fault(
        name,
        `No column of ${name} is found. Name one “${name}${first === 0 ? ' (µm)' : ''}” in the heading row.`,
      );
    }
    if (new Set(own.map((role) => role!.bound)).size < own.length) {
      fault(name, `Two columns are read as ${name}. Rename or remove one of them.`);
    }
  }
  return faults.length > 0 ? { faults } : { roles };
}

/** null: a unit that is none of those read; the wavelength must name its own. */
function factorOf(heading: string, first: number): number | null {
  const named =
    heading.match(/[([]([^)\]]*)[)\]]/)?.[1] ?? heading.match(/[, ](nm|µm|um|microns?)(?= |$)/)?.[1];
  const unit = (named ?? '').replace(/²/g, '2').replace(/⁻¹/g, '-1').replace(/[ ·]/g, '');
  if (first === 0) return wavelengthUnits[unit] ?? null;
  return first === 1 && !massUnits.has(unit) ? null : 1;
}

function readLines(lines: Line[], headings: string[], roles: (Role | null)[], mark: string): ReadText {
  const faults: TextFault[] = [];
  const decimalComma = mark !== ',' && hasDecimalComma(lines.flatMap(({ cells }) => cells));
  const rows = lines.map(({ row, cells }) => {
    const values = measuredColumns.map(() => '');
    if (cells.length !== headings.length) {
      const message = `The row has ${cells.length} columns, the heading ${headings.length}. ${mark === ',' ? 'With decimal commas part the columns by tab or semicolon.' : 'Add or remove a column.'}`;
      faults.push({ row, column: '', value: cells.join(mark), message });
      return values;
    }
    roles.forEach((role, at) => {
      if (!role) return;
      const cell = cells[at]!;
      const read = readNumberText(decimalComma ? cell.replace(',', '.') : cell);
      if ('fault' in read) faults.push({ row, column: headings[at]!, value: cell, message: read.fault });
      else values[columnOf(role)] = String(Number((read.value * role.factor).toPrecision(12)));
    });
    return withBounds(values);
  });
  if (faults.length > 0) return { faults };
  const wrong = rangeFaults(rows, lines, headings, roles);
  if (wrong.length > 0) return { faults: wrong };
  return { rows, unused: headings.filter((_, at) => !roles[at]) };
}

const columnOf = ({ first, bound }: Role): number =>
  first === 0 ? 0 : first + ['low', 'central', 'high'].indexOf(bound);

/** 0,55 can be no thousand: one such number tells the sign of the whole block, if no point stands in it. */
const hasDecimalComma = (cells: readonly string[]): boolean =>
  cells.some((cell) => /^[+-]?(0,\d+|\d+,(\d{1,2}|\d{4,}))$/.test(cell)) &&
  !cells.some((cell) => /^[+-]?\d*\.\d/.test(cell));

function withBounds(values: string[]): string[] {
  return values.map((value, at) => {
    if (at === 0 || value !== '') return value;
    return values[Math.floor((at - 1) / 3) * 3 + 2]!;
  });
}

function rangeFaults(
  rows: string[][],
  lines: Line[],
  headings: string[],
  roles: (Role | null)[],
): TextFault[] {
  const read = readMeasured(rows.map((values, key) => ({ key, values })));
  const faults = Object.entries('faults' in read ? read.faults : {}).map(([path, message]): TextFault => {
    const [at, ...field] = path.split('.');
    const column = measuredColumns.findIndex(({ name }) => name === field.join('.'));
    // A bound without a column is the middle value, and is told there.
    const own = roles.findIndex((role) => role && columnOf(role) === column);
    const middle = column === 0 ? 0 : Math.floor((column - 1) / 3) * 3 + 2;
    const told = own >= 0 ? own : roles.findIndex((role) => role && columnOf(role) === middle);
    const { row, cells } = lines[Number(at)]!;
    return { row, column: headings[told]!, value: cells[told]!, message: `${message} Correct the value.` };
  });
  const seen = new Map<string, number>();
  rows.forEach(([wavelength], at) => {
    const before = seen.get(wavelength!);
    const { row } = lines[at]!;
    const told = roles.findIndex((role) => role?.first === 0);
    if (before === undefined) seen.set(wavelength!, row);
    else {
      const message = `The wavelength stands in row ${before} too. Remove one of the two rows.`;
      faults.push({ row, column: headings[told]!, value: lines[at]!.cells[told]!, message });
    }
  });
  // Of one cell the first word is enough: its low, middle and high bounds repeat it.
  return faults.filter(
    (fault, at) => faults.findIndex(({ row, column }) => row === fault.row && column === fault.column) === at,
  );
}

/** Rows that hold more than a wavelength stay; one that stands in both is refused rather than overwritten. */
export function addRows(
  form: MeasuredForm,
  rows: readonly string[][],
): { form: MeasuredForm } | { fault: string } {
  const kept = form.filter(({ values }) => values.slice(1).some((value) => value.trim() !== ''));
  const twice = rows.find(([wavelength]) =>
    kept.some(({ values }) => {
      const read = readNumberText(values[0]!);
      return 'value' in read && read.value === Number(wavelength);
    }),
  );
  if (twice) {
    return {
      fault: `${twice[0]} µm stands in the form already. Remove it there, or leave its row out of the text.`,
    };
  }
  const next = Math.max(-1, ...form.map(({ key }) => key)) + 1;
  return { form: [...kept, ...rows.map((values, at) => ({ key: next + at, values: [...values] }))] };
}
