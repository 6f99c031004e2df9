import {
  Button,
  Dialog,
  DialogActions,
  DialogBody,
  DialogContent,
  DialogSurface,
  DialogTitle,
  Radio,
  RadioGroup,
  Select,
  Textarea,
} from '@fluentui/react-components';
import { useQuery } from '@tanstack/react-query';
import { useState, type FormEvent } from 'react';
import { ErrorState } from '../../../shared/feedback/error-state';
import { FormField } from '../../../shared/form/form-field';
import { submitOnCtrlEnter } from '../../../shared/form/submit-keys';
import { counted } from '../../../shared/number/format';
import { decide, type Decision } from '../changes';
import { datasetChoicesQuery } from '../queries';
import type { Bench } from '../use-bench';

const grades = {
  measured: 'Measured: as the instrument gave it',
  recomputed: 'Recomputed: from parts, such as concentration and accumulation',
  digitised: 'Digitised: read off a figure',
} as const;

/** Grade and dataset: the two things that an approval decides beside yes. */
export function ApproveDialog({
  bench: { detail, changing },
  onClose,
}: {
  bench: Bench;
  onClose: () => void;
}) {
  const [grade, setGrade] = useState<keyof typeof grades>('measured');
  const [target, setTarget] = useState<'new' | 'version'>('new');
  const [slug, setSlug] = useState('');
  const [reason, setReason] = useState('');
  const datasets = useQuery(datasetChoicesQuery);
  const fitting = datasets.data?.filter(({ kind }) => kind === detail.kind) ?? [];
  const unchosen = target === 'version' && slug === '';
  const submit = async (event: FormEvent) => {
    event.preventDefault();
    if (unchosen) return;
    const decision: Decision = {
      decision: 'approve',
      grade,
      ...(target === 'version' ? { datasetSlug: slug } : {}),
      ...(reason.trim() ? { reason: reason.trim() } : {}),
    };
    if (await changing.change(decide(decision))) onClose();
  };
  return (
    <Dialog open modalType="modal" onOpenChange={(_, data) => !data.open && onClose()}>
      <DialogSurface>
        <form onSubmit={(event) => void submit(event)} onKeyDown={submitOnCtrlEnter}>
          <DialogBody>
            <DialogTitle>Approve {detail.number}</DialogTitle>
            <DialogContent className="sl-stack">
              <p className="sl-13 sl-second">
                {counted(detail.counts.usableRows, 'row')} become an immutable version with a checksum
                {detail.counts.leftOut > 0 &&
                  `; ${counted(detail.counts.leftOut, 'left-out row')} stay behind`}
                .
              </p>
              {changing.problem && (
                <ErrorState error={changing.problem} kept="Your choices are still here." />
              )}
              {datasets.error && <ErrorState error={datasets.error} retry={() => void datasets.refetch()} />}
              <FormField name="grade" label="Grade">
                <Select value={grade} onChange={(_, data) => setGrade(data.value as keyof typeof grades)}>
                  {Object.entries(grades).map(([value, label]) => (
                    <option key={value} value={value}>
                      {label}
                    </option>
                  ))}
                </Select>
              </FormField>
              <FormField name="target" label="It becomes">
                <RadioGroup value={target} onChange={(_, data) => setTarget(data.value as 'new' | 'version')}>
                  <Radio value="new" label="A new dataset" />
                  <Radio
                    value="version"
                    disabled={fitting.length === 0}
                    label="A new version of a dataset in Holdings"
                  />
                </RadioGroup>
              </FormField>
              {target === 'version' && (
                <FormField
                  name="datasetSlug"
                  label="Dataset"
                  problem={changing.problem}
                  hint="The version in force is superseded; fields and estimates on it are marked."
                >
                  <Select value={slug} onChange={(_, data) => setSlug(data.value)}>
                    <option value="">choose …</option>
                    {fitting.map((dataset) => (
                      <option key={dataset.slug} value={dataset.slug}>
                        {dataset.title}
                      </option>
                    ))}
                  </Select>
                </FormField>
              )}
              <FormField name="reason" label="Note to the contributor" hint="May be left empty.">
                <Textarea
                  rows={2}
                  maxLength={4000}
                  value={reason}
                  onChange={(_, data) => setReason(data.value)}
                />
              </FormField>
            </DialogContent>
            <DialogActions>
              <Button onClick={onClose}>Keep as it is</Button>
              <Button type="submit" appearance="primary" disabled={unchosen || changing.busy}>
                Approve
              </Button>
            </DialogActions>
          </DialogBody>
        </form>
      </DialogSurface>
    </Dialog>
  );
}
