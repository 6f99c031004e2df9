import type { Role } from '@siltlight/common/wire/people';
import { Button, Input } from '@fluentui/react-components';
import { MailAdd20Regular } from '@fluentui/react-icons';
import { useMutation, useQueryClient } from '@tanstack/react-query';
import { useState, type FormEvent } from 'react';
import { ApiProblem } from '../../shared/api/api-problem';
import { ErrorState } from '../../shared/feedback/error-state';
import { useSay } from '../../shared/feedback/toasts';
import { FormField } from '../../shared/form/form-field';
import { submitOnCtrlEnter } from '../../shared/form/submit-keys';
import { formatDateTime } from '../../shared/number/time';
import { invite, peopleQuery } from './queries';
import { RoleBoxes } from './role-boxes';

/** Invites somebody by mail; to invite again sends a new link. */
export function InviteForm() {
  const client = useQueryClient();
  const say = useSay();
  const [name, setName] = useState('');
  const [email, setEmail] = useState('');
  const [roles, setRoles] = useState<Role[]>(['scientist']);
  const send = useMutation({
    mutationFn: invite,
    onSuccess: async ({ person, expiresAt }) => {
      say(`${person.name} is invited`, `The link works until ${formatDateTime(expiresAt)}.`);
      setName('');
      setEmail('');
      await client.invalidateQueries({ queryKey: peopleQuery.queryKey });
    },
  });
  const problem = send.error instanceof ApiProblem ? send.error : null;
  const submit = (event: FormEvent) => {
    event.preventDefault();
    send.mutate({ name, email, roles });
  };
  return (
    <form className="people-form" onSubmit={submit} onKeyDown={submitOnCtrlEnter}>
      {problem && <ErrorState error={problem} fields={['name', 'email', 'roles']} />}
      <FormField name="name" label="Name" required problem={problem}>
        <Input value={name} onChange={(_, data) => setName(data.value)} />
      </FormField>
      <FormField name="email" label="E-mail" required problem={problem}>
        <Input type="email" value={email} onChange={(_, data) => setEmail(data.value)} />
      </FormField>
      <FormField name="roles" label="Roles" problem={problem}>
        <RoleBoxes roles={roles} onChange={setRoles} />
      </FormField>
      <div>
        <Button type="submit" appearance="primary" icon={<MailAdd20Regular />} disabled={send.isPending}>
          Send the invitation
        </Button>
      </div>
    </form>
  );
}
