import { Button, Select } from '@fluentui/react-components';
import { Add16Regular, Delete16Regular } from '@fluentui/react-icons';
import { NumberInput } from './number-input';
import { materials, ruleWords } from './optics-words';
import { isMixingRule, type Faults, type IndexForm } from './species-form';

type Props = {
  label: string;
  value: IndexForm;
  path: string;
  faults: Faults;
  onChange: (value: IndexForm) => void;
};

const kinds = { material: 'From a table', typed: 'Typed n and k', mixture: 'Mixture of tables' } as const;

/** Refractive index: a table, typed values, or several minerals in one particle by a mixing rule. */
export function IndexFields({ label, value, path, faults, onChange }: Props) {
  const table = materials.find((one) => one.id === value.material);
  return (
    <fieldset className="optics-index">
      <legend>{label}</legend>
      <div className="optics-pair">
        <Select
          size="small"
          aria-label={`${label}: from`}
          value={value.kind}
          onChange={(_, data) => onChange({ ...value, kind: data.value as IndexForm['kind'] })}
        >
          {Object.entries(kinds).map(([kind, word]) => (
            <option key={kind} value={kind}>
              {word}
            </option>
          ))}
        </Select>
        {value.kind === 'material' && (
          <MaterialSelect
            label={`${label}: table`}
            value={value.material}
            onChange={(material) => onChange({ ...value, material })}
          />
        )}
        {value.kind === 'mixture' && (
          <Select
            size="small"
            aria-label={`${label}: mixing rule`}
            value={value.rule}
            onChange={(_, data) => isMixingRule(data.value) && onChange({ ...value, rule: data.value })}
          >
            {Object.entries(ruleWords).map(([rule, word]) => (
              <option key={rule} value={rule}>
                {word}
              </option>
            ))}
          </Select>
        )}
        {value.kind === 'typed' && (
          <div className="optics-pair">
            <NumberInput
              label="n"
              longLabel={`${label}: n`}
              value={value.real}
              fault={faults[`${path}.real`]}
              onChange={(real) => onChange({ ...value, real })}
            />
            <NumberInput
              label="k, of n − ik"
              longLabel={`${label}: k`}
              value={value.imaginary}
              fault={faults[`${path}.imaginary`]}
              onChange={(imaginary) => onChange({ ...value, imaginary })}
            />
          </div>
        )}
      </div>
      {value.kind === 'material' && table && (
        <p className="sl-small sl-muted">
          {table.source}; {table.reach}.
        </p>
      )}
      {value.kind === 'mixture' && <Parts {...{ label, value, path, faults, onChange }} />}
    </fieldset>
  );
}

function Parts({ label, value, path, faults, onChange }: Props) {
  const change = (at: number, part: Partial<IndexForm['parts'][0]>) =>
    onChange({ ...value, parts: value.parts.map((one, i) => (i === at ? { ...one, ...part } : one)) });
  return (
    <>
      {value.parts.map((part, at) => (
        <div key={at} className="optics-part">
          <MaterialSelect
            label={`${label}: mineral ${at + 1}`}
            value={part.material}
            onChange={(material) => change(at, { material })}
          />
          <NumberInput
            label="Share of volume"
            longLabel={`${label}: share of mineral ${at + 1}`}
            value={part.volumeFraction}
            fault={faults[`${path}.parts.${at}.volumeFraction`]}
            onChange={(volumeFraction) => change(at, { volumeFraction })}
          />
          <Button
            size="small"
            appearance="subtle"
            icon={<Delete16Regular />}
            aria-label={`Remove mineral ${at + 1}`}
            disabled={value.parts.length === 1}
            onClick={() => onChange({ ...value, parts: value.parts.filter((_, i) => i !== at) })}
          />
        </div>
      ))}
      <Button
        size="small"
        appearance="subtle"
        icon={<Add16Regular />}
        disabled={value.parts.length >= 8}
        onClick={() =>
          onChange({ ...value, parts: [...value.parts, { material: 'illite', volumeFraction: '0' }] })
        }
      >
        Add a mineral
      </Button>
    </>
  );
}

function MaterialSelect({
  label,
  value,
  onChange,
}: {
  label: string;
  value: string;
  onChange: (material: string) => void;
}) {
  return (
    <Select size="small" aria-label={label} value={value} onChange={(_, data) => onChange(data.value)}>
      {materials.map(({ id, title }) => (
        <option key={id} value={id}>
          {title}
        </option>
      ))}
    </Select>
  );
}
