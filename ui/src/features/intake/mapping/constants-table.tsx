import { Button, Input } from '@fluentui/react-components';
import { Add16Regular, Dismiss16Regular } from '@fluentui/react-icons';
import { fieldOf } from '@siltlight/common/dataset/field';
import { FieldSelect, hasUnit } from './columns-table';
import { addConstant, removeConstant, setConstant, type Constant } from './mapping-edits';
import type { MappingDraft } from './use-mapping-draft';

/** Values that hold for every row of the sheet: a site, a position above the table, an archive. */
export function ConstantsTable({ draft, sheet }: { draft: MappingDraft; sheet: string }) {
  const constants = draft.mapping.constants
    .map((constant, at) => ({ constant, at }))
    .filter((one) => one.constant.sheet === sheet);
  const given = new Set([
    ...constants.map(({ constant }) => constant.field),
    ...draft.mapping.columns.filter((one) => one.sheet === sheet).map(({ field }) => field),
  ]);
  const next = draft.kind.fields.find(({ field, required }) => required && !given.has(field))?.field ?? '';
  return (
    <section aria-label="Values for every row">
      <h3>
        For every row of “{sheet}” <span className="sl-small sl-muted">where no column says it</span>
      </h3>
      <ul className="mapping-constants">
        {constants.map(({ constant, at }) => (
          <ConstantRow key={at} draft={draft} constant={constant} at={at} />
        ))}
      </ul>
      <Button
        size="small"
        icon={<Add16Regular />}
        onClick={() => draft.edit(addConstant(draft.mapping, sheet, next))}
      >
        Add a value
      </Button>
    </section>
  );
}

function ConstantRow({ draft, constant, at }: { draft: MappingDraft; constant: Constant; at: number }) {
  const declared = fieldOf(draft.kind, constant.field);
  const name = declared?.title ?? 'the value';
  const set = (change: Partial<Constant>) => draft.edit(setConstant(draft.mapping, at, change));
  const faultOf = (part: string) =>
    draft.faults.find(({ place }) => place === `constant-${at}-${part}`)?.message;
  const fault = faultOf('field') ?? faultOf('text') ?? faultOf('unit');
  return (
    <li>
      <FieldSelect
        label="What the value is"
        fields={draft.kind.fields}
        value={constant.field}
        empty="choose …"
        invalid={faultOf('field') !== undefined}
        onPick={(field) => set({ field })}
      />
      <Input
        size="small"
        aria-label={`${name} of every row`}
        aria-invalid={faultOf('text') !== undefined}
        value={constant.text}
        onChange={(_, data) => set({ text: data.value })}
      />
      <Input
        size="small"
        aria-label={`Unit of ${name}`}
        aria-invalid={faultOf('unit') !== undefined}
        disabled={!declared || !hasUnit(declared)}
        placeholder={declared?.canonicalUnit}
        value={constant.unit ?? ''}
        onChange={(_, data) => set({ unit: data.value === '' ? null : data.value })}
      />
      <Button
        size="small"
        appearance="subtle"
        icon={<Dismiss16Regular />}
        aria-label={`Remove ${name}`}
        onClick={() => draft.edit(removeConstant(draft.mapping, at))}
      />
      <small className={fault ? 'mapping-why panel-fault' : 'mapping-why'}>
        {fault ?? `${constant.cell ? `${constant.cell}: ` : ''}${constant.reason}`}
      </small>
    </li>
  );
}
