import { Input } from '@fluentui/react-components';
import { useEffect, useState, type ReactNode } from 'react';
import type { ApiProblem } from '../../shared/api/api-problem';
import { FormField } from '../../shared/form/form-field';
import { readNumberText } from '../../shared/form/number-text';
import { faultOf, type NumberName } from './set-up';

type Props = {
  name: NumberName;
  /** Name in the request, where the service reports faults. */
  sentAs: string;
  label: ReactNode;
  hint?: string;
  value: number;
  disabled?: boolean;
  problem: ApiProblem | null;
  onChange: (value: number) => void;
};

const textOf = (value: number) => String(value).replace('-', '\u2212');

/** A number typed freely; only one within its range is taken over, what was typed stays as it is. */
export function NumberField({ name, sentAs, label, hint, value, disabled, problem, onChange }: Props) {
  const [text, setText] = useState(textOf(value));
  useEffect(() => {
    // The value changed elsewhere (browser back): what is shown follows, unless it already means the same.
    setText((shown) => {
      const read = readNumberText(shown);
      return 'value' in read && read.value === value ? shown : textOf(value);
    });
  }, [value]);
  const read = readNumberText(text);
  const fault = 'fault' in read ? read.fault : faultOf(name, read.value);
  const take = (next: string) => {
    setText(next);
    const number = readNumberText(next);
    if ('value' in number && faultOf(name, number.value) === null) onChange(number.value);
  };
  return (
    <FormField name={sentAs} problem={problem} fault={fault ?? undefined} label={<>{label}</>} hint={hint}>
      <Input inputMode="decimal" value={text} disabled={disabled} onChange={(_, data) => take(data.value)} />
    </FormField>
  );
}
