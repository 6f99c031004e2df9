import { Checkbox, Combobox, Field, Input, Option } from '@fluentui/react-components';
import type { DatasetSummary } from '@siltlight/common/wire/datasets';
import type { ApiProblem } from '../../shared/api/api-problem';
import { EmptyState } from '../../shared/feedback/empty-state';
import { FormField } from '../../shared/form/form-field';
import { counted } from '../../shared/number/format';
import type { FieldChoice } from './queries';

type Props = {
  choice: FieldChoice;
  datasets: DatasetSummary[];
  fractions: string[];
  problem: ApiProblem | null;
  onChange: (choice: FieldChoice) => void;
};

const COMMONEST = 'The commonest of the chosen versions';

/** Which dataset versions count, which size fraction, and a title of one's own. */
export function FieldForm({ choice, datasets, fractions, problem, onChange }: Props) {
  const set = (change: Partial<FieldChoice>) => onChange({ ...choice, ...change });
  return (
    <div className="field-form">
      <fieldset>
        <legend>Dataset versions in force</legend>
        {datasets.length === 0 && (
          <EmptyState title="No dataset is approved yet.">
            A field needs at least one approved dataset with samples in both windows.
          </EmptyState>
        )}
        {datasets.map((dataset) => (
          <DatasetBox key={dataset.slug} {...{ dataset, choice }} onChange={set} />
        ))}
        {choice.datasetVersionIds.length === 0 && datasets.length > 0 && (
          <p role="alert" className="field-fault">
            Tick at least one dataset version.
          </p>
        )}
      </fieldset>
      <div className="field-form-more">
        <FormField
          name="sizeCutoff"
          problem={problem}
          label="Size fraction"
          hint="One only: fluxes of different fractions are not compared."
        >
          <Combobox
            freeform
            placeholder={COMMONEST}
            value={choice.sizeCutoff ?? ''}
            selectedOptions={[choice.sizeCutoff ?? '']}
            onChange={(event) => set({ sizeCutoff: event.target.value.trim() || undefined })}
            onOptionSelect={(_, data) => set({ sizeCutoff: data.optionValue || undefined })}
          >
            <Option value="" text={COMMONEST}>
              {COMMONEST}
            </Option>
            {fractions.map((fraction) => (
              <Option key={fraction} value={fraction} text={fraction}>
                {fraction}
              </Option>
            ))}
          </Combobox>
        </FormField>
        <FormField name="title" problem={problem} label="Title" hint="Left empty, slice and way name it.">
          <Input
            maxLength={200}
            value={choice.title ?? ''}
            onChange={(_, data) => set({ title: data.value || undefined })}
          />
        </FormField>
        <Field label="Way">
          <span className="sl-13">
            Regional scaling: the base field of today, scaled in each region by the ratio of the records.
          </span>
        </Field>
      </div>
    </div>
  );
}

type BoxProps = {
  dataset: DatasetSummary;
  choice: FieldChoice;
  onChange: (change: Partial<FieldChoice>) => void;
};

function DatasetBox({ dataset, choice, onChange }: BoxProps) {
  const { versionId, number } = dataset.latest;
  const on = choice.datasetVersionIds.includes(versionId);
  const toggle = () =>
    onChange({
      datasetVersionIds: on
        ? choice.datasetVersionIds.filter((one) => one !== versionId)
        : [...choice.datasetVersionIds, versionId],
    });
  return (
    <Checkbox
      checked={on}
      onChange={toggle}
      label={
        <>
          {dataset.title}{' '}
          <span className="sl-small sl-muted">
            version {number}, {counted(dataset.siteCount, 'site')}, {counted(dataset.sampleCount, 'sample')}
            {dataset.invented && ', invented'}
          </span>
        </>
      }
    />
  );
}
