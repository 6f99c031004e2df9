import { Button, Input } from '@fluentui/react-components';
import { newPassword as newPasswordRule } from '@siltlight/common/wire/auth';
import { useMutation, useQueryClient } from '@tanstack/react-query';
import { useState, type FormEvent } from 'react';
import { ApiProblem } from '../../shared/api/api-problem';
import { ErrorState } from '../../shared/feedback/error-state';
import { useSay } from '../../shared/feedback/toasts';
import { FormField } from '../../shared/form/form-field';
import { changePassword, sessionsQuery } from './queries';

export function PasswordForm() {
  const client = useQueryClient();
  const say = useSay();
  const [present, setPresent] = useState('');
  const [next, setNext] = useState('');
  const [fault, setFault] = useState<string>();
  const change = useMutation({
    mutationFn: changePassword,
    onSuccess: async () => {
      setPresent('');
      setNext('');
      say('The password is changed', 'Your other sessions are ended.');
      await client.invalidateQueries({ queryKey: sessionsQuery.queryKey });
    },
  });
  const problem = change.error instanceof ApiProblem ? change.error : null;
  const send = (event: FormEvent) => {
    event.preventDefault();
    const found = newPasswordRule.safeParse(next).error?.issues[0]?.message;
    setFault(found);
    if (!found) change.mutate({ presentPassword: present, newPassword: next });
  };
  return (
    <form className="people-form" onSubmit={send}>
      {problem && <ErrorState error={problem} fields={['presentPassword', 'newPassword']} />}
      <FormField name="presentPassword" label="Present password" required problem={problem}>
        <Input
          type="password"
          autoComplete="current-password"
          value={present}
          onChange={(_, data) => setPresent(data.value)}
        />
      </FormField>
      <FormField
        name="newPassword"
        label="New password"
        required
        problem={problem}
        fault={fault}
        hint="At least 15 characters; several unrelated words do well."
      >
        <Input
          type="password"
          autoComplete="new-password"
          value={next}
          onChange={(_, data) => setNext(data.value)}
        />
      </FormField>
      <div>
        <Button type="submit" disabled={change.isPending}>
          Change the password
        </Button>
      </div>
    </form>
  );
}
