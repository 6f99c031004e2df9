import { Button, ProgressBar } from '@fluentui/react-components';
import { METADATA_FORM } from '@siltlight/common/dataset/metadata-form';
import { useEffect, useRef, type FocusEvent, type FormEvent } from 'react';
import { ErrorState } from '../../../shared/feedback/error-state';
import { submitOnCtrlEnter } from '../../../shared/form/submit-keys';
import { PanelHead } from '../panel-head';
import type { Bench } from '../use-bench';
import { completeness } from './check-metadata';
import { CreatorsField } from './creators-field';
import { MetadataQuestion } from './metadata-question';
import type { MetadataDraft } from './use-metadata-draft';

type Props = { bench: Bench; draft: MetadataDraft; onClose: () => void };

/** What the sheet does not say: asked once, checked while typing, saved when a field is left. */
export function MetadataPanel({ bench, draft, onClose }: Props) {
  const { detail, changing, field } = bench;
  const { mayEdit } = detail.rights;
  const form = useRef<HTMLFormElement>(null);
  useEffect(() => {
    if (field)
      form.current
        ?.querySelector<HTMLElement>(`[data-field="${field}"] :is(input, textarea, select)`)
        ?.focus();
  }, [field]);
  const leave = (event: FocusEvent<HTMLFormElement>) => {
    // Within a group of fields (a creator) moving on does not save yet.
    if (event.currentTarget !== event.relatedTarget) void draft.save();
  };
  const submit = (event: FormEvent) => {
    event.preventDefault();
    void draft.save();
  };
  const done = completeness(detail.missingMetadata, draft.metadata);
  return (
    <aside className="bench-panel" aria-label="Metadata">
      <PanelHead title="Metadata" sub={savedWord(draft, changing.busy)} onClose={onClose} />
      <form ref={form} className="panel-form" onSubmit={submit} onBlur={leave} onKeyDown={submitOnCtrlEnter}>
        <div className="panel-body">
          <div className="completeness">
            <ProgressBar value={done.answered / done.of} thickness="large" aria-label="Answered" />
            <p className="sl-small">
              {done.wanted.length === 0
                ? 'All that is wanted is answered.'
                : `${done.answered} of ${done.of} wanted answers; open: ${done.wanted.map(({ label }) => label.toLowerCase()).join(', ')}.`}
            </p>
          </div>
          {changing.problem && draft.dirty && (
            <ErrorState
              error={changing.problem}
              kept="What you typed is still here."
              fields={METADATA_FORM.map((one) => one.field)}
            />
          )}
          <fieldset disabled={!mayEdit} className="panel-fields">
            {METADATA_FORM.map((question) =>
              question.input === 'people' ? (
                <CreatorsField key={question.field} question={question} draft={draft} />
              ) : (
                <MetadataQuestion
                  key={question.field}
                  question={question}
                  draft={draft}
                  problem={changing.problem}
                  bySheet={
                    question.required &&
                    draft.metadata[question.field] === undefined &&
                    !detail.missingMetadata.includes(question.field)
                  }
                />
              ),
            )}
          </fieldset>
        </div>
        {mayEdit && (
          <footer className="panel-foot">
            <span className="sl-small sl-muted">Saved when you leave a field.</span>
            <Button
              type="submit"
              appearance="primary"
              disabled={!draft.dirty || !draft.storable || changing.busy}
            >
              Save
            </Button>
          </footer>
        )}
      </form>
    </aside>
  );
}

function savedWord({ dirty, storable }: MetadataDraft, busy: boolean): string {
  if (busy) return 'saving …';
  if (!dirty) return 'saved';
  return storable ? 'not saved yet' : 'not saved: put the marked fields right';
}
