import { Button } from '@fluentui/react-components';
import { Add16Regular, Delete16Regular } from '@fluentui/react-icons';
import { emptyRow, measuredColumns, type MeasuredForm } from './measured-form';
import { NumberInput } from './number-input';
import type { Faults } from './species-form';

type Props = { form: MeasuredForm; faults: Faults; onChange: (form: MeasuredForm) => void };

/** Values of a paper, wavelength by wavelength, each with its bounds. */
export function MeasuredFields({ form, faults, onChange }: Props) {
  const change = (at: number, column: number, text: string) =>
    onChange(
      form.map((row, i) =>
        i === at ? { ...row, values: row.values.map((one, c) => (c === column ? text : one)) } : row,
      ),
    );
  return (
    <section className="optics-form" aria-label="Measured values">
      <header>
        <h3>Measured values</h3>
        <span className="figure-sub">one wavelength within 0.5 to 0.6 µm is what estimates use</span>
        <span className="sl-grow" />
        <Button
          size="small"
          appearance="subtle"
          icon={<Add16Regular />}
          onClick={() => onChange([...form, emptyRow(Math.max(-1, ...form.map((row) => row.key)) + 1)])}
        >
          Add a wavelength
        </Button>
      </header>
      {form.map((row, at) => (
        <div key={row.key} className="optics-measured" role="group" aria-label={`Wavelength ${at + 1}`}>
          {measuredColumns.map(({ name, label }, column) => (
            <NumberInput
              key={name}
              label={label}
              longLabel={`Wavelength ${at + 1}: ${label}`}
              value={row.values[column]!}
              fault={faults[`${at}.${name}`]}
              onChange={(text) => change(at, column, text)}
            />
          ))}
          <Button
            size="small"
            appearance="subtle"
            icon={<Delete16Regular />}
            aria-label={`Remove wavelength ${at + 1}`}
            disabled={form.length === 1}
            onClick={() => onChange(form.filter((_, i) => i !== at))}
          />
        </div>
      ))}
    </section>
  );
}
