import { Button, Checkbox, Switch } from '@fluentui/react-components';
import { Add16Regular, Delete16Regular } from '@fluentui/react-icons';
import { MAX_SPECIES_MODES } from '@siltlight/common/wire/optics';
import { useColourMode } from '../../shared/theme/colour-mode';
import { seriesColours } from '../../shared/theme/ramps';
import { IndexFields } from './index-fields';
import { NumberInput } from './number-input';
import { withMode, type Faults, type ModeForm, type ModeNumber, type SpeciesForm } from './species-form';

type Props = { form: SpeciesForm; faults: Faults; onChange: (form: SpeciesForm) => void };

const shown: Record<ModeNumber, string> = {
  medianRadiusUm: 'Median, µm',
  geometricStdDev: 'Width σ',
  numberFraction: 'Number',
  minRadiusUm: 'From, µm',
  maxRadiusUm: 'To, µm',
  densityGCm3: 'Density',
};
const longLabels: Record<ModeNumber, string> = {
  medianRadiusUm: 'median radius by number, µm',
  geometricStdDev: 'geometric standard deviation',
  numberFraction: 'share or count of particles',
  minRadiusUm: 'smallest radius, µm',
  maxRadiusUm: 'largest radius, µm',
  densityGCm3: 'density, grams per cubic centimetre',
};
const names = Object.keys(shown) as ModeNumber[];

/** Modes of the size distribution, their index, and the options of the species. */
export function ModesForm({ form, faults, onChange }: Props) {
  const { mode: theme } = useColourMode();
  const changeMode = (at: number, change: Partial<ModeForm>) =>
    onChange({ ...form, modes: form.modes.map((one, i) => (i === at ? { ...one, ...change } : one)) });
  return (
    <section className="optics-form" aria-label="Particles">
      <header>
        <h3>Modes</h3>
        <span className="figure-sub">radii, lognormal by number; density in g/cm³</span>
        <span className="sl-grow" />
        <Button
          size="small"
          appearance="subtle"
          icon={<Add16Regular />}
          disabled={form.modes.length >= MAX_SPECIES_MODES}
          onClick={() => onChange(withMode(form))}
        >
          Add a mode
        </Button>
      </header>
      {form.modes.map((mode, at) => (
        <div key={mode.key} role="group" aria-label={`Mode ${mode.name}`}>
          <div className={at === 0 ? 'optics-mode first' : 'optics-mode'}>
            <span
              className="optics-swatch"
              style={{ background: seriesColours[theme][form.modes.length > 1 ? (at + 1) % 6 : 0] }}
              aria-hidden
            />
            <NumberInput
              text
              label="Mode"
              longLabel={`Name of mode ${at + 1}`}
              value={mode.name}
              fault={faults[`modes.${at}.name`]}
              onChange={(name) => changeMode(at, { name })}
            />
            {names.map((name) => (
              <NumberInput
                key={name}
                label={shown[name]}
                longLabel={`${mode.name}: ${longLabels[name]}`}
                value={mode[name]}
                fault={faults[`modes.${at}.${name}`]}
                onChange={(value) => changeMode(at, { [name]: value })}
              />
            ))}
            <Button
              size="small"
              appearance="subtle"
              icon={<Delete16Regular />}
              aria-label={`Remove ${mode.name}`}
              disabled={form.modes.length === 1}
              onClick={() => onChange({ ...form, modes: form.modes.filter((_, i) => i !== at) })}
            />
          </div>
          {form.modes.length > 1 && !form.oneIndex && (
            <IndexFields
              label={`Refractive index of ${mode.name}`}
              value={mode.index}
              path={`modes.${at}.index`}
              faults={faults}
              onChange={(index) => changeMode(at, { index })}
            />
          )}
        </div>
      ))}
      {(form.oneIndex || form.modes.length === 1) && (
        <IndexFields
          label="Refractive index"
          value={form.modes[0]!.index}
          path="modes.0.index"
          faults={faults}
          onChange={(index) => changeMode(0, { index })}
        />
      )}
      {form.modes.length > 1 && (
        <Checkbox
          label="One index for all modes"
          checked={form.oneIndex}
          onChange={(_, data) => onChange({ ...form, oneIndex: data.checked === true })}
        />
      )}
      <Options {...{ form, faults, onChange }} />
    </section>
  );
}

function Options({ form, faults, onChange }: Props) {
  return (
    <div className="optics-options">
      <NumberInput
        label="Hygroscopicity κ"
        value={form.kappa}
        fault={faults.kappa}
        onChange={(kappa) => onChange({ ...form, kappa })}
      />
      <NumberInput
        label="Relative humidity, 0 to 0.99"
        value={form.relativeHumidity}
        fault={faults.relativeHumidity}
        onChange={(relativeHumidity) => onChange({ ...form, relativeHumidity })}
      />
      <NumberInput
        label="Radii uncertain by a factor of"
        value={form.radiusFactor}
        fault={faults['spread.radiusFactor']}
        onChange={(radiusFactor) => onChange({ ...form, radiusFactor })}
      />
      <NumberInput
        label="k uncertain by a factor of"
        value={form.absorptionFactor}
        fault={faults['spread.absorptionFactor']}
        onChange={(absorptionFactor) => onChange({ ...form, absorptionFactor })}
      />
      <Switch
        label="Add coarse dust"
        checked={form.coarse}
        onChange={(_, data) => onChange({ ...form, coarse: data.checked })}
      />
      <NumberInput
        label="Mass above 5 µm diameter times"
        disabled={!form.coarse}
        value={form.coarseFactor}
        fault={faults.coarseFactor}
        onChange={(coarseFactor) => onChange({ ...form, coarseFactor })}
      />
      <Switch
        label="Correct for shape"
        checked={form.shape}
        onChange={(_, data) => onChange({ ...form, shape: data.checked })}
      />
      <NumberInput
        label="Extinction times"
        disabled={!form.shape}
        value={form.shapeFactor}
        fault={faults.shapeFactor}
        onChange={(shapeFactor) => onChange({ ...form, shapeFactor })}
      />
    </div>
  );
}
