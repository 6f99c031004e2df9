import { Combobox, Input, Option, Select, Textarea } from '@fluentui/react-components';
import type { MetadataField } from '@siltlight/common/dataset/metadata-form';
import type { ApiProblem } from '../../../shared/api/api-problem';
import { FormField } from '../../../shared/form/form-field';
import type { MetadataDraft } from './use-metadata-draft';

type Props = { question: MetadataField; draft: MetadataDraft; problem: ApiProblem | null; bySheet: boolean };

/** One question of the form, with its help and what is wrong with the answer. */
export function MetadataQuestion({ question, draft, problem, bySheet }: Props) {
  const { field, label, help, required } = question;
  return (
    <div data-field={field}>
      <FormField
        name={field}
        label={label}
        required={required}
        hint={bySheet ? `${help} The sheet says it in each row.` : help}
        problem={draft.dirty ? problem : null}
        fault={draft.faults[field]}
      >
        <Answer question={question} draft={draft} />
      </FormField>
    </div>
  );
}

function Answer({
  question: { field, input, choices = [] },
  draft,
  ...wired
}: {
  question: MetadataField;
  draft: MetadataDraft;
}) {
  const given = draft.metadata[field];
  const value = typeof given === 'string' ? given : '';
  const set = (text: string) => draft.edit({ [field]: text === '' ? undefined : text });
  if (input === 'long-text')
    return <Textarea {...wired} rows={3} value={value} onChange={(_, data) => set(data.value)} />;
  if (input === 'licence')
    return (
      <Combobox
        {...wired}
        freeform
        value={value}
        selectedOptions={value ? [value] : []}
        placeholder="SPDX identifier"
        onChange={(event) => set(event.target.value)}
        onOptionSelect={(_, data) => set(data.optionValue ?? '')}
      >
        {choices.map((choice) => (
          <Option key={choice.value} value={choice.value} text={choice.value}>
            {choice.value}: {choice.label}
          </Option>
        ))}
      </Combobox>
    );
  if (input === 'choice')
    return (
      <Select {...wired} value={value} onChange={(_, data) => set(data.value)}>
        <option value="">choose …</option>
        {choices.map((choice) => (
          <option key={choice.value} value={choice.value}>
            {choice.label}
          </option>
        ))}
      </Select>
    );
  return <Input {...wired} value={value} onChange={(_, data) => set(data.value)} />;
}
