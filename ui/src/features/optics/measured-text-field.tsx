import { Button, Field, Textarea } from '@fluentui/react-components';
import { useState } from 'react';
import { FileDrop } from '../../shared/form/file-drop';
import type { MeasuredForm } from './measured-form';
import { addRows, readMeasuredText, type TextFault } from './measured-text';

type Props = {
  text: string;
  form: MeasuredForm;
  onText: (text: string) => void;
  onChange: (form: MeasuredForm) => void;
};

/** Faults shown at once; the rest are counted. */
const SHOWN_FAULTS = 8;
const MAX_FILE_BYTES = 1_000_000;
const whole = (message: string): TextFault => ({ row: 0, column: '', value: '', message });

/** A table of a paper, pasted or dropped. The text stays until it is read; what stands in the form stays. */
export function MeasuredTextField({ text, form, onText, onChange }: Props) {
  const [faults, setFaults] = useState<readonly TextFault[]>([]);
  const [told, setTold] = useState('');
  // Only how it begins: from then on the person opens and closes it.
  const [open] = useState(text !== '');
  const refuse = (found: readonly TextFault[]) => {
    setFaults(found);
    setTold('');
  };
  const read = () => {
    const answer = readMeasuredText(text);
    if ('faults' in answer) return refuse(answer.faults);
    const added = addRows(form, answer.rows);
    if ('fault' in added) return refuse([whole(added.fault)]);
    onChange(added.form);
    setFaults([]);
    const left = answer.unused.length > 0 ? ` Columns not used: ${answer.unused.join(', ')}.` : '';
    setTold(`Read ${answer.rows.length} wavelengths into the form.${left}`);
    // Text with columns that the form has no place for is kept.
    if (answer.unused.length === 0) onText('');
  };
  const take = async (file: File) => {
    if (file.size > MAX_FILE_BYTES) {
      return refuse([whole(`${file.name} is larger than 1 MB. Paste the rows of the set instead.`)]);
    }
    try {
      const content = await file.text();
      onText(text.trim() === '' ? content : `${text.trimEnd()}\n${content}`);
      refuse([]);
    } catch {
      refuse([whole(`${file.name} could not be read. Drop it again, or paste its rows.`)]);
    }
  };
  return (
    <details className="optics-paste" open={open}>
      <summary>Paste or drop a table</summary>
      <FileDrop label="Choose a text file" accept=".csv,.tsv,.txt" onFiles={([file]) => void take(file!)}>
        <Field
          label="Heading row, then a row for each wavelength"
          hint="wavelength (nm) or (µm), extinction in m²/g, ω, g; columns “g low” and “g high” give bounds, else the bounds are the value"
        >
          <Textarea value={text} rows={5} resize="vertical" onChange={(_, data) => onText(data.value)} />
        </Field>
      </FileDrop>
      <Button size="small" disabled={text.trim() === ''} onClick={read}>
        Read the values
      </Button>
      <p className="sl-small" role="status">
        {told}
      </p>
      {faults.length > 0 && (
        <ul className="optics-fault" role="alert">
          {faults.slice(0, SHOWN_FAULTS).map((fault) => (
            <li key={`${fault.row} ${fault.column} ${fault.message}`}>{wordsOf(fault)}</li>
          ))}
          {faults.length > SHOWN_FAULTS && <li>{faults.length - SHOWN_FAULTS} more.</li>}
        </ul>
      )}
    </details>
  );
}

function wordsOf({ row, column, value, message }: TextFault): string {
  if (row === 0) return message;
  const place = column ? `Row ${row}, column ${column}` : `Row ${row}`;
  return `${place}${value && value !== column ? `, “${value}”` : ''}: ${message}`;
}
