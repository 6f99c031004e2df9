import type { SampleRow, TracedValue } from '../../dataset/sample-row';
import { columnLetter } from '../../sheet/grid';
import type { RawCell, RawSheet } from '../../sheet/grid';
import type { Mapping } from '../../sheet/mapping';
import { splitAddress } from '../place';
import type { SubmissionMetadata, VettingContext } from '../context';

const EMPTY: SampleRow = {
  sheet: 'Data',
  row: 2,
  quantity: 'dust',
  site: 'Core A',
  latitudeDeg: -75.1,
  longitudeDeg: 123.35,
  archive: null,
  ageKaBp: 21,
  ageYoungKaBp: null,
  ageOldKaBp: null,
  ageSigmaKa: null,
  depthM: null,
  depthTopM: null,
  depthBaseM: null,
  fluxGM2Yr: 0.01,
  fluxSigmaGM2Yr: 0.001,
  sizeCutoff: null,
  densityGCm3: null,
  sedimentationRateCmKyr: null,
  dustFraction: null,
  concentrationNgG: null,
  accumulationKgM2Yr: null,
  elevationM: null,
  waterDepthM: null,
  remark: null,
  cells: {},
};

/** Fields in the order of their columns; a field beyond these takes the next letter. */
const COLUMNS = [
  ...Object.keys(EMPTY).filter((key) => !['sheet', 'row', 'cells', 'quantity'].includes(key)),
  ...['aod', 'aodSigma', 'wavelengthNm', 'angstromExponent', 'aerosolSpecies'],
];

const letterOf = (field: string): string => columnLetter(COLUMNS.indexOf(field));

type RowProperties = Partial<Omit<SampleRow, 'cells'>> & {
  /** cells with a problem, a code or a field of their own; laid over those made from the values */
  cells?: Record<string, Partial<TracedValue>>;
};

/** A sample of an invented core; each value that is not null gets its cell. */
export function row(properties: RowProperties = {}): SampleRow {
  const { cells: given = {}, ...values } = properties;
  const sample: SampleRow = { ...EMPTY, ...values, cells: {} };
  const traced = (field: string, value: number | string | null): TracedValue => ({
    cell: `${letterOf(field)}${sample.row}`,
    raw: value === null ? '' : String(value),
    value,
    unit: '',
    rule: 'as written',
  });
  for (const field of COLUMNS) {
    const value = (sample as unknown as Record<string, number | string | null | undefined>)[field];
    if (value !== null && value !== undefined) sample.cells[field] = traced(field, value);
  }
  for (const [field, cell] of Object.entries(given)) {
    sample.cells[field] = { ...traced(field, cell.value ?? null), ...cell };
  }
  return sample;
}

/** Rows numbered downwards from row 2. */
export const rows = (...properties: RowProperties[]): SampleRow[] =>
  properties.map((one, index) => row({ row: index + 2, ...one }));

/** A cell that could not be read. */
export const unreadable = (raw: string, code = 'not-a-number'): Partial<TracedValue> => ({
  raw,
  value: null,
  problem: { code, message: `"${raw}" was not understood` },
});

/** All that the form can answer. */
export const answers: SubmissionMetadata = {
  title: 'Dust flux at an invented core',
  creators: [{ name: 'A. Example', orcid: '0000-0002-1825-0097' }],
  licence: 'CC-BY-4.0',
  publicationDoi: '10.1234/example.5678',
  archive: 'ice',
  method: 'laser counter, full size range; tephra layers were taken out',
  sizeCutoff: 'bulk',
  dustDefinition: 'insoluble dust, total',
  ageDatum: 'BP 1950',
  ageModel: 'ice flow model tied to volcanic markers',
  uncertaintyMeaning: '1 sigma',
  densityBasis: 'measured',
};

/** A whole context round some rows: mapping and workbook are made from their cells. */
export function context(samples: SampleRow[], changes: Partial<VettingContext> = {}): VettingContext {
  return {
    workbook: { fileName: 'example.xlsx', format: 'xlsx', sheets: sheetsOf(samples), readNotes: [] },
    mapping: mappingOf(samples),
    rows: samples,
    metadata: answers,
    formOffered: true,
    heldSites: [],
    limits: {},
    missingCodes: {},
    ...changes,
  };
}

/** Units as the demo columns carry them. */
const UNITS: Record<string, string> = {
  fluxGM2Yr: 'g m-2 yr-1',
  fluxSigmaGM2Yr: 'g m-2 yr-1',
  ageKaBp: 'ka BP',
};

export function mappingOf(samples: SampleRow[]): Mapping {
  const sheets = [...new Set(samples.map((sample) => sample.sheet))];
  const used = (sheet: string) => samples.filter((sample) => sample.sheet === sheet);
  return {
    tables: sheets.map((sheet) => ({
      sheet,
      headerRows: [1],
      unitsRow: null,
      firstRow: 2,
      lastRow: Math.max(...used(sheet).map((sample) => sample.row)),
      used: true,
      reason: 'made for a test',
    })),
    columns: sheets.flatMap((sheet) => {
      const fields = new Set(used(sheet).flatMap((sample) => Object.keys(sample.cells)));
      return COLUMNS.filter((field) => fields.has(field)).map((field) => ({
        sheet,
        column: letterOf(field),
        heading: field,
        field,
        unit: UNITS[field] ?? null,
        confidence: 1,
        reason: 'made for a test',
      }));
    }),
    constants: [],
  };
}

/** The same context with one mapped column changed. */
export function withColumn(
  base: VettingContext,
  field: string,
  change: Partial<Mapping['columns'][number]>,
): VettingContext {
  const columns = base.mapping.columns.map((column) =>
    column.field === field ? { ...column, ...change } : column,
  );
  return { ...base, mapping: { ...base.mapping, columns } };
}

/** The same context with one workbook cell changed. */
export function withRawCell(base: VettingContext, address: string, cell: RawCell): VettingContext {
  const at = splitAddress(address)!;
  const column = [...at.column].reduce((n, letter) => n * 26 + letter.charCodeAt(0) - 64, 0) - 1;
  const [first, ...others] = structuredClone(base.workbook.sheets);
  first!.rows[at.row - 1]![column] = cell;
  return { ...base, workbook: { ...base.workbook, sheets: [first!, ...others] } };
}

function sheetsOf(samples: SampleRow[]): RawSheet[] {
  return [...new Set(samples.map((sample) => sample.sheet))].map((name) => {
    const last = Math.max(...samples.map((sample) => sample.row));
    const grid = Array.from({ length: last }, (): (RawCell | null)[] => COLUMNS.map(() => null));
    for (const sample of samples.filter((one) => one.sheet === name)) {
      for (const [field, traced] of Object.entries(sample.cells)) {
        grid[sample.row - 1]![COLUMNS.indexOf(field)] = { text: traced.raw, kind: 'text' };
      }
    }
    return { name, rows: grid, columnCount: COLUMNS.length };
  });
}

/** A context of optical depths: dust at 550 nm, unless a row says otherwise. */
export function opticalDepth(
  ...properties: { [field: string]: number | string | null | Record<string, Partial<TracedValue>> }[]
): VettingContext {
  const samples = properties.map(({ cells, ...given }, index) => {
    const values = { aod: 0.3, wavelengthNm: 550, aerosolSpecies: 'dust', ...given };
    const made = Object.entries(values).filter(([, value]) => value !== null);
    return row({
      row: index + 2,
      fluxGM2Yr: null,
      fluxSigmaGM2Yr: null,
      cells: {
        ...Object.fromEntries(made.map(([field, value]) => [field, { value: value }])),
        ...(cells as Record<string, Partial<TracedValue>> | undefined),
      },
    });
  });
  const metadata = { ...answers, dustDefinition: undefined, method: 'sun photometer' };
  return context(samples, { kind: 'point-optical-depth', metadata });
}
