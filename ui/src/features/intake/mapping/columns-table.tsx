import { Input, Select } from '@fluentui/react-components';
import { fieldOf, type FieldDeclaration } from '@siltlight/common/dataset/field';
import { formatPercent } from '../../../shared/number/format';
import { setColumn, unitWay, type Column } from './mapping-edits';
import type { MappingDraft } from './use-mapping-draft';

type Props = { draft: MappingDraft; sheet: string; onColumn: (column: string) => void };

/** What each column of the sheet holds and in which unit, with how sure the proposal is and why. */
export function ColumnsTable({ draft, sheet, onColumn }: Props) {
  const columns = draft.mapping.columns
    .map((column, at) => ({ column, at }))
    .filter((one) => one.column.sheet === sheet);
  return (
    <section aria-label="Columns">
      <h3>
        Columns of “{sheet}” <span className="sl-small sl-muted">field, unit in the file, how sure</span>
      </h3>
      {columns.length === 0 ? (
        <p className="sl-13 sl-muted">
          No column was found on this sheet. Put its table to use above and apply.
        </p>
      ) : (
        <ul className="mapping-columns">
          {columns.map(({ column, at }) => (
            <ColumnRow key={at} draft={draft} column={column} at={at} onColumn={onColumn} />
          ))}
        </ul>
      )}
    </section>
  );
}

type RowProps = { draft: MappingDraft; column: Column; at: number; onColumn: (column: string) => void };

function ColumnRow({ draft, column, at, onColumn }: RowProps) {
  const declared = column.field === null ? undefined : fieldOf(draft.kind, column.field);
  const faultOf = (part: string) =>
    draft.faults.find(({ place }) => place === `column-${at}-${part}`)?.message;
  const fault = faultOf('field') ?? faultOf('unit');
  const set = (change: Partial<Column>) => draft.edit(setColumn(draft.mapping, at, change));
  const pickField = (name: string) => {
    const next = fieldOf(draft.kind, name);
    set({ field: next?.field ?? null, unit: next && hasUnit(next) ? column.unit : null });
  };
  return (
    <li>
      <button
        type="button"
        className="finding-place"
        onClick={() => onColumn(column.column)}
        aria-label={`Show column ${column.column}`}
      >
        {column.column}
      </button>
      <span className="mapping-heading" title={column.heading}>
        {column.heading || <span className="sl-muted">no heading</span>}
      </span>
      <FieldSelect
        label={`Field of column ${column.column}`}
        fields={draft.kind.fields}
        value={column.field ?? ''}
        empty="not imported"
        invalid={faultOf('field') !== undefined}
        onPick={pickField}
      />
      <Input
        size="small"
        aria-label={`Unit of column ${column.column}`}
        aria-invalid={faultOf('unit') !== undefined}
        disabled={!declared || !hasUnit(declared)}
        placeholder={declared && hasUnit(declared) ? declared.canonicalUnit : ''}
        value={column.unit ?? ''}
        onChange={(_, data) => set({ unit: data.value === '' ? null : data.value })}
      />
      <Sureness confidence={column.confidence} />
      <small className={fault ? 'mapping-why panel-fault' : 'mapping-why'}>
        {fault ?? [column.reason, declared && unitWay(declared, column.unit)].filter(Boolean).join('; ')}
      </small>
    </li>
  );
}

export const hasUnit = ({ quantity, canonicalUnit }: FieldDeclaration) =>
  canonicalUnit !== '' && quantity !== 'text' && quantity !== 'count';

type SelectProps = {
  label: string;
  fields: readonly FieldDeclaration[];
  value: string;
  empty: string;
  invalid?: boolean;
  onPick: (field: string) => void;
};

export const FieldSelect = ({ label, fields, value, empty, invalid, onPick }: SelectProps) => (
  <Select
    size="small"
    aria-label={label}
    aria-invalid={invalid}
    value={value}
    onChange={(_, data) => onPick(data.value)}
  >
    <option value="">{empty}</option>
    {fields.map(({ field, title }) => (
      <option key={field} value={field}>
        {title}
      </option>
    ))}
  </Select>
);

const Sureness = ({ confidence }: { confidence: number }) => (
  <span className="sureness" title={`${formatPercent(confidence)} sure`}>
    <i style={{ width: `${Math.round(confidence * 100)}%` }} />
    <span className="sl-hidden">{formatPercent(confidence)} sure</span>
  </span>
);
