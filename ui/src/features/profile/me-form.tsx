import { Button, Input } from '@fluentui/react-components';
import { useMutation, useQueryClient, useSuspenseQuery } from '@tanstack/react-query';
import { useState, type FormEvent } from 'react';
import { ApiProblem } from '../../shared/api/api-problem';
import { sessionQuery } from '../../shared/api/session';
import { ErrorState } from '../../shared/feedback/error-state';
import { useSay } from '../../shared/feedback/toasts';
import { FormField } from '../../shared/form/form-field';
import { submitOnCtrlEnter } from '../../shared/form/submit-keys';
import { changeMe, meQuery } from './queries';

/** The own name and ORCID iD, as they stand in citations. */
export function MeForm() {
  const client = useQueryClient();
  const say = useSay();
  const { data: me } = useSuspenseQuery(meQuery);
  const [name, setName] = useState(me.name);
  const [orcid, setOrcid] = useState(me.orcid ?? '');
  const save = useMutation({
    mutationFn: changeMe,
    onSuccess: async (view) => {
      client.setQueryData(meQuery.queryKey, view);
      await client.invalidateQueries({ queryKey: sessionQuery.queryKey });
      say('Saved');
    },
  });
  const problem = save.error instanceof ApiProblem ? save.error : null;
  const send = (event: FormEvent) => {
    event.preventDefault();
    save.mutate({ name, orcid: orcid.trim() || null, version: me.version });
  };
  return (
    <form className="people-form" onSubmit={send} onKeyDown={submitOnCtrlEnter}>
      {problem && (
        <ErrorState error={problem} kept="What you typed is still here." fields={['name', 'orcid']} />
      )}
      <FormField name="name" label="Name" required problem={problem}>
        <Input autoComplete="name" value={name} onChange={(_, data) => setName(data.value)} />
      </FormField>
      <FormField
        name="orcid"
        label="ORCID iD"
        problem={problem}
        hint="Written as 0000-0002-1825-0097; it goes into citations."
      >
        <Input value={orcid} onChange={(_, data) => setOrcid(data.value)} />
      </FormField>
      <p className="sl-13 sl-muted">
        {me.email}; {me.roles.join(', ') || 'no role yet'}
      </p>
      <div>
        <Button type="submit" appearance="primary" disabled={save.isPending}>
          Save
        </Button>
      </div>
    </form>
  );
}
