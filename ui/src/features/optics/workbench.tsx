import { Button, MessageBar, MessageBarBody, Radio, RadioGroup } from '@fluentui/react-components';
import { Globe20Regular, Save20Regular } from '@fluentui/react-icons';
import type { OpticalSetDetail } from '@siltlight/common/wire/optics';
import { useQueries } from '@tanstack/react-query';
import { useState } from 'react';
import { useSearchParams } from 'react-router-dom';
import { useHasRole } from '../../shared/api/session';
import { ConfirmDialog } from '../../shared/feedback/confirm-dialog';
import { LeaveGuard } from '../../shared/form/leave-guard';
import { useSettled } from '../../shared/form/use-settled';
import { Page } from '../../shared/page/page';
import { StateTag } from '../../shared/page/state-tag';
import { ComparePicker, MAX_BESIDE } from './compare-picker';
import { Equations } from './equations';
import { MeasuredFields } from './measured-fields';
import { MeasuredTextField } from './measured-text-field';
import { ModesForm } from './modes-form';
import './optics.css';
import { opticalSetQuery } from './queries';
import { readSet, setFormOf, emptySetForm, type SetForm } from './set-form';
import { SetFigures } from './set-figures';
import { definitionIn, rowsOf, type ShownSet } from './shown-set';
import { SizeFigure } from './size-figure';
import { pathOf } from './species-form';
import { SummaryLine } from './summary-line';
import { ToldFields } from './told-fields';
import { useCurves } from './use-curves';
import { useSetActs } from './use-set-acts';
import { VersionsList } from './versions-list';

const OWN = '#own';
/** Sets beside take the palette from its end: modes take it from its start. */
const LAST_COLOUR = 5;
/** Between a stroke and the fast curves, so that a burst of strokes asks once. */
const TYPING_MS = 120;

/** A set at work: form at the left, curves that follow it, others beside it. */
export function Workbench({ set }: { set: OpticalSetDetail | null }) {
  const [form, setForm] = useState<SetForm>(() => startOf(set));
  const [saved, setSaved] = useState(form);
  const [pasted, setPasted] = useState('');
  const [asking, setAsking] = useState(false);
  const [params, setParams] = useSearchParams();
  const isScientist = useHasRole('scientist');
  const read = readSet(form);
  const dirty = JSON.stringify(form) !== JSON.stringify(saved);
  const ownSet = set !== null && (set.rights.mayEdit || set.rights.mayAddVersion);
  const acts = useSetActs({ set, form, read, dirty, onSaved: (_, kept) => setSaved(kept) });
  const beside = (params.get('with') ?? '').split(',').filter(Boolean).slice(0, MAX_BESIDE);
  const sets = useShownSets(set?.title ?? (form.title || 'This set'), read, beside);
  const title = set?.title ?? 'New optical set';
  const fault = sets.drawn?.fault;
  const faults = fault ? { [pathOf(fault.field)]: fault.message, ...read.faults } : read.faults;
  const named = ownSet || form.title.trim() !== '';
  const ready = read.draft !== null && named && !acts.busy;
  return (
    <Page
      title={title}
      crumbs={[{ label: 'Optics', to: '/optics' }, { label: title }]}
      state={set && <StateTag state={set.state} />}
      sub={set ? `version ${set.number}${dirty ? ', changed here' : ''}` : 'not kept yet'}
      actions={
        <>
          <ComparePicker
            own={set?.slug ?? null}
            chosen={beside}
            onChange={(slugs) =>
              setParams(slugs.length > 0 ? { with: slugs.join(',') } : {}, { replace: true })
            }
          />
          {isScientist && (
            <Button
              icon={<Save20Regular />}
              disabled={!ready || (set?.rights.mayEdit === true && !dirty)}
              onClick={() => acts.save()}
            >
              {saveWords(set)}
            </Button>
          )}
          {isScientist && (
            <Button
              appearance="primary"
              icon={<Globe20Regular />}
              disabled={!ready || !(set?.rights.mayPublish || dirty)}
              onClick={() => setAsking(true)}
            >
              Publish
            </Button>
          )}
        </>
      }
    >
      <LeaveGuard when={(dirty || pasted.trim() !== '') && !acts.busy} />
      <ConfirmDialog
        open={asking}
        title="Publish this set?"
        act="Publish"
        onAct={() => {
          setAsking(false);
          acts.publish();
        }}
        onClose={() => setAsking(false)}
      >
        A published version cannot be changed; estimates may use it from then on. Its values at 0.55 µm are
        computed anew by the service.
      </ConfirmDialog>
      {acts.problem && (
        <MessageBar intent="error" className="optics-problem">
          <MessageBarBody>
            <b>{acts.problem.title}.</b> {acts.problem.detail}
          </MessageBarBody>
        </MessageBar>
      )}
      <div className="optics-top">
        <div className="optics-left">
          {(set === null || set.basis.kind === 'bulk') && (
            <RadioGroup
              layout="horizontal"
              aria-label="The set is"
              value={form.kind}
              onChange={(_, data) => setForm({ ...form, kind: data.value as SetForm['kind'] })}
            >
              <Radio value="particles" label="Computed from particles" />
              <Radio value="measured" label="Measured values" />
            </RadioGroup>
          )}
          {form.kind === 'particles' ? (
            <ModesForm
              form={form.particles}
              faults={faults}
              onChange={(particles) => setForm({ ...form, particles })}
            />
          ) : (
            <>
              <MeasuredFields
                form={form.measured}
                faults={faults}
                onChange={(measured) => setForm({ ...form, measured })}
              />
              <MeasuredTextField
                text={pasted}
                form={form.measured}
                onText={setPasted}
                onChange={(measured) => setForm({ ...form, measured })}
              />
            </>
          )}
          {fault && <p className="optics-fault">{fault.message}</p>}
        </div>
        <div>
          {form.kind === 'particles' && <SizeFigure sets={sets.shown} />}
          {form.kind === 'particles' && <SummaryLine drawn={sets.drawn} species={form.species} />}
          {form.kind === 'measured' && (
            <ToldFields form={form} mayName={!ownSet} problem={acts.problem} onChange={setForm} />
          )}
        </div>
      </div>
      <SetFigures sets={sets.shown} />
      {form.kind === 'particles' && (
        <ToldFields form={form} mayName={!ownSet} problem={acts.problem} onChange={setForm} />
      )}
      {set && <VersionsList slug={set.slug} />}
      <Equations />
    </Page>
  );
}

function saveWords(set: OpticalSetDetail | null): string {
  if (set?.rights.mayEdit) return 'Save draft';
  if (set?.rights.mayAddVersion) return `Save as draft of version ${set.number + 1}`;
  return 'Save as draft of your own';
}

/** Somebody else's set is a start for one's own, which needs a name of its own. */
function startOf(set: OpticalSetDetail | null): SetForm {
  if (!set) return emptySetForm;
  const form = setFormOf(set);
  const own = set.rights.mayEdit || set.rights.mayAddVersion;
  return own ? form : { ...form, title: `${set.title}, changed` };
}

function useShownSets(title: string, read: ReturnType<typeof readSet>, beside: readonly string[]) {
  const definition = useLastGood(read.definition);
  const settled = useSettled(definition, TYPING_MS);
  const others = useQueries({ queries: beside.map(opticalSetQuery) }).flatMap(({ data }) =>
    data ? [data] : [],
  );
  const wanted = [
    ...(settled ? [{ key: OWN, definition: settled }] : []),
    ...others.flatMap((other) => {
      const theirs = definitionIn(other);
      return theirs ? [{ key: other.slug, definition: theirs }] : [];
    }),
  ];
  const drawn = useCurves(wanted);
  const own: ShownSet = {
    key: OWN,
    title,
    colour: 0,
    definition,
    curves: definition ? drawn.get(OWN)?.curves : undefined,
    rows: read.rows,
  };
  const shown = others.map((other, at): ShownSet => ({
    key: other.slug,
    title: other.title,
    colour: LAST_COLOUR - at,
    definition: definitionIn(other),
    curves: drawn.get(other.slug)?.curves,
    rows: rowsOf(other),
  }));
  return { drawn: drawn.get(OWN), shown: [own, ...shown] };
}

/** While a field is half typed, the curves of the last readable form stay. */
function useLastGood<T>(value: T | null): T | null {
  const [last, setLast] = useState(value);
  if (value !== null && JSON.stringify(value) !== JSON.stringify(last)) setLast(value);
  return value ?? last;
}
