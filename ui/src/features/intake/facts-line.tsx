import { fieldOf, type DatasetKind } from '@siltlight/common/dataset/field';
import { datasetKind } from '@siltlight/common/dataset/kinds';
import { convertTo, UNIT_KINDS, type UnitKind } from '@siltlight/common/units/convert';
import type { SubmissionDetail } from '@siltlight/common/wire/submissions';
import { Digits } from '../../shared/number/digits';
import { formatBytes } from '../../shared/number/format';
import { Unit } from '../../shared/number/unit';
import { fileAddress } from './queries';

const rowsText = (rows: readonly number[]) =>
  rows.length > 1 ? `rows ${rows.join(', ')}` : `row ${rows[0]}`;

/** What was read: file, sheet, header and units rows, rows, mapped columns, the factor of the value. */
export function FactsLine({ detail, sheet }: { detail: SubmissionDetail; sheet: string }) {
  const { mapping, counts, workbook } = detail;
  const table = mapping.tables.find((one) => one.used && one.sheet === sheet);
  const columns = mapping.columns.filter((column) => column.sheet === sheet);
  const mapped = columns.filter(({ field }) => field !== null).length;
  return (
    <div className="facts">
      <span>
        <a
          href={fileAddress(detail.id)}
          className="facts-file"
          title={`${formatBytes(detail.fileBytes)}, as it was sent`}
        >
          {detail.fileName}
        </a>
        {workbook.encoding && <span className="sl-muted"> {workbook.encoding}</span>}
      </span>
      {table ? (
        <span>
          {table.headerRows.length > 0 ? `header in ${rowsText(table.headerRows)}` : 'no header'}
          {table.unitsRow !== null && `, units in row ${table.unitsRow}`}
        </span>
      ) : (
        <span>this sheet is left alone</span>
      )}
      <span>
        <b>
          <Digits value={counts.usableRows} />
        </b>{' '}
        of <Digits value={counts.rows} /> rows usable{counts.leftOut > 0 && `, ${counts.leftOut} left out`}
      </span>
      {table && (
        <span>
          <b>{mapped}</b> of {columns.length} columns mapped
        </span>
      )}
      <UnitFact kind={datasetKind(detail.kind)} columns={columns} />
      <span className="sl-grow" />
      <Key />
    </div>
  );
}

type Columns = SubmissionDetail['mapping']['columns'];

function UnitFact({ kind, columns }: { kind: DatasetKind; columns: Columns }) {
  const declared = fieldOf(kind, kind.valueField);
  const column = columns.find(({ field }) => field === kind.valueField);
  if (!declared || !column?.unit || !(declared.quantity in UNIT_KINDS)) return null;
  const conversion = convertTo(declared.quantity as UnitKind, column.unit);
  if (!('factor' in conversion)) return null;
  return (
    <span title={conversion.explanation}>
      {declared.title.toLowerCase()} in <Unit of={conversion.canonical} />
      {conversion.factor !== 1 && (
        <>
          , 1 <Unit of={column.unit} /> ={' '}
          <Digits value={conversion.factor} decimals={decimalsShown(conversion.factor)} /> of it
        </>
      )}
    </span>
  );
}

/** As many decimals as the factor has, four figures at most. */
const decimalsShown = (factor: number) => {
  const text = String(Number(factor.toPrecision(4)));
  return text.includes('e') ? undefined : (text.split('.')[1]?.length ?? 0);
};

const Key = () => (
  <span className="facts-key" aria-hidden="true">
    <i className="corner error" />
    error
    <i className="corner warning" />
    warning
    <i className="corner note" />
    note
    <i className="mended-key" />
    mended
  </span>
);
