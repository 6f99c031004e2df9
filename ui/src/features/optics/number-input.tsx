import { Input } from '@fluentui/react-components';
import { useId } from 'react';

type Props = {
  label: string;
  /** For those who hear it: which mode the field belongs to. */
  longLabel?: string;
  value: string;
  fault?: string;
  disabled?: boolean;
  text?: boolean;
  onChange: (value: string) => void;
};

/** A small labelled field with its fault beneath; what was typed stays as it is. */
export function NumberInput({ label, longLabel, value, fault, disabled, text, onChange }: Props) {
  const faultId = useId();
  return (
    <label className="optics-cell">
      <span>{label}</span>
      <Input
        size="small"
        inputMode={text ? undefined : 'decimal'}
        aria-label={longLabel}
        aria-invalid={fault ? true : undefined}
        aria-describedby={fault ? faultId : undefined}
        value={value}
        disabled={disabled}
        onChange={(_, data) => onChange(data.value)}
      />
      {fault && (
        <span id={faultId} className="optics-fault">
          {fault}
        </span>
      )}
    </label>
  );
}
