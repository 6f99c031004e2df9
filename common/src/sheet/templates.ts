import type { DatasetKind, FieldDeclaration } from '../dataset/field';
import { isRecordKind } from '../dataset/record-kinds';
import { DomainError } from '../physical/domain-error';

/** Spelling of units in templates where the canonical one would not be plain to a contributor. */
const UNIT_SHOWN: Record<string, string> = { '1': 'fraction' };

/** Invented values of the two example rows, by field; plainly no measurement. */
const EXAMPLES: Record<string, [string, string]> = {
  site: ['Example core', 'Example core'],
  latitudeDeg: ['-12.34', '-12.34'],
  longitudeDeg: ['56.78', '56.78'],
  ageKaBp: ['20.5', '21.5'],
  fluxGM2Yr: ['1.25', '1.5'],
  fluxSigmaGM2Yr: ['0.15', '0.2'],
  aod: ['0.12', '0.15'],
  aodSigma: ['0.02', '0.02'],
  wavelengthNm: ['550', '550'],
  remark: ['example: delete this row', 'example: delete this row'],
  region: ['EXAMPLE', 'EXAMPLE'],
  event: ['Example event', 'Example event'],
  material: ['Example mineral', 'Example mineral'],
  month: ['1', '2'],
  gridValue: ['1.25', '1.5'],
  surfaceAlbedo: ['0.25', '0.35'],
  cloudFraction: ['0.55', '0.65'],
  temperatureK: ['281.5', '282.5'],
  realPart: ['1.55', '1.56'],
  imaginaryPart: ['0.0015', '0.0025'],
  massExtinctionM2G: ['0.65', '0.55'],
  singleScatteringAlbedo: ['0.95', '0.96'],
  asymmetry: ['0.72', '0.71'],
  co2Ppm: ['212.5', '213.5'],
  co2SigmaPpm: ['1.5', '1.5'],
  ch4Ppb: ['412.5', '413.5'],
  n2oPpb: ['212.5', '213.5'],
  seriesValue: ['4.25', '4.35'],
  seriesSigma: ['0.05', '0.05'],
};

export interface Template {
  fileName: string;
  /** heading row, units row, example rows */
  rows: string[][];
  /** one line a field, for a notes sheet or a text file beside the table */
  notes: string[];
}

/**
 * A table to fill in for a dataset kind: headings and units as `proposeWorkbook` recognises them with certainty,
 * two invented example rows that say so, and notes on every column.
 *
 * @throws DomainError `no-such-field` when a wanted field is not of the kind
 */
export function templateFor(kind: DatasetKind, wanted: string[] = usualFields(kind)): Template {
  const fields = wanted.map((name) => {
    const field = kind.fields.find((one) => one.field === name);
    if (!field)
      throw new DomainError('no-such-field', {
        field: 'field',
        value: name,
        allowed: kind.fields.map((one) => one.field),
      });
    return field;
  });
  return {
    fileName: `siltlight-${kind.id}-template.csv`,
    rows: [
      fields.map((field) => headingOf(field)),
      fields.map((field) => unitOf(field)),
      ...[0, 1].map((row) => fields.map((field) => EXAMPLES[field.field]?.[row] ?? '')),
    ],
    notes: fields.map((field) => noteOf(field, kind)),
  };
}

/** Fields wanted of most files beside those that are required or hold the values. */
const USUAL = new Set([
  ...[
    'site',
    'latitudeDeg',
    'longitudeDeg',
    'elevationM',
    'wavelengthNm',
    'remark',
    'region',
    'month',
    'material',
  ],
  ...['ageKaBp', 'ageSigmaKa', 'depthTopM', 'depthBaseM', 'event'],
]);

function usualFields(kind: DatasetKind): string[] {
  const values = new Set([kind.valueField, kind.sigmaField]);
  if (isRecordKind(kind)) for (const field of (kind.usableWith ?? []).flat()) values.add(field);
  return kind.fields
    .filter(({ field, required }) => required || USUAL.has(field) || (values.has(field) && field in EXAMPLES))
    .map(({ field }) => field);
}

/** The first synonym, which recognition takes as certain. */
const headingOf = (field: FieldDeclaration): string => {
  const heading = field.headings[0] ?? field.title;
  return heading.charAt(0).toUpperCase() + heading.slice(1);
};

const unitOf = ({ canonicalUnit }: FieldDeclaration): string => UNIT_SHOWN[canonicalUnit] ?? canonicalUnit;

function noteOf(field: FieldDeclaration, kind: DatasetKind): string {
  const range =
    field.min === undefined && field.max === undefined
      ? ''
      : ` Range ${field.min ?? '…'} to ${field.max ?? '…'}.`;
  const need = field.required ? 'Required. ' : field.field === kind.sigmaField ? 'Wanted. ' : '';
  return `${headingOf(field)}: ${need}${field.help}${range}`;
}
