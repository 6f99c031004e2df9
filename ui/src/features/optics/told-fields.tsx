import { Input, Select, Textarea } from '@fluentui/react-components';
import { SPECIES, type SpeciesName } from '@siltlight/common/wire/optics';
import type { ApiProblem } from '../../shared/api/api-problem';
import { FormField } from '../../shared/form/form-field';
import { speciesWords } from './optics-words';
import type { SetForm } from './set-form';

type Props = {
  form: SetForm;
  /** A set that has a name already keeps it. */
  mayName: boolean;
  problem: ApiProblem | null;
  onChange: (form: SetForm) => void;
};

/** Name, species, source and evidence of a set. */
export function ToldFields({ form, mayName, problem, onChange }: Props) {
  return (
    <section className="optics-told" aria-label="What the set rests on">
      <h3>What it rests on</h3>
      {mayName && (
        <FormField name="title" problem={problem} label="Name of the set" required>
          <Input value={form.title} onChange={(_, data) => onChange({ ...form, title: data.value })} />
        </FormField>
      )}
      <FormField name="species" problem={problem} label="Species">
        <Select
          value={form.species}
          onChange={(_, data) => onChange({ ...form, species: data.value as SpeciesName })}
        >
          {SPECIES.map((one) => (
            <option key={one} value={one}>
              {speciesWords[one]}
            </option>
          ))}
        </Select>
      </FormField>
      <FormField name="sizeCutoff" problem={problem} label="Sizes it stands for">
        <Input
          value={form.sizeCutoff}
          onChange={(_, data) => onChange({ ...form, sizeCutoff: data.value })}
        />
      </FormField>
      <FormField name="source" problem={problem} label="Source" required>
        <Textarea value={form.source} onChange={(_, data) => onChange({ ...form, source: data.value })} />
      </FormField>
      <FormField
        name="evidence"
        problem={problem}
        label="Evidence"
        hint="What was read, what is from memory, what is assumed."
        required
      >
        <Textarea value={form.evidence} onChange={(_, data) => onChange({ ...form, evidence: data.value })} />
      </FormField>
      <FormField name="note" problem={problem} label="Note">
        <Textarea value={form.note} onChange={(_, data) => onChange({ ...form, note: data.value })} />
      </FormField>
    </section>
  );
}
