import { Button, Input } from '@fluentui/react-components';
import { useMutation } from '@tanstack/react-query';
import { useState, type FormEvent } from 'react';
import { useNavigate } from 'react-router-dom';
import { ApiProblem } from '../../shared/api/api-problem';
import { ErrorState } from '../../shared/feedback/error-state';
import { FormField } from '../../shared/form/form-field';
import { faultOfNewPassword, NewPasswordField } from './new-password-field';
import { acceptInvitation, makeFirstAdministrator } from './queries';

type Props = { token: string; first: boolean };
const welcome = 'Your password is set. Sign in with it.';
const fields = ['name', 'email', 'password'];

/** Takes an invitation, or makes the first administrator of an empty installation. */
export function NewAccountForm({ token, first }: Props) {
  const navigate = useNavigate();
  const [name, setName] = useState('');
  const [email, setEmail] = useState('');
  const [password, setPassword] = useState('');
  const [fault, setFault] = useState<string>();
  const make = useMutation({
    mutationFn: () =>
      first
        ? makeFirstAdministrator({ token, name, email: email.trim(), password })
        : acceptInvitation({ token, password }),
    onSuccess: (account) =>
      navigate('/sign-in', { replace: true, state: { email: account.email, done: welcome } }),
  });
  const problem = make.error instanceof ApiProblem ? make.error : null;
  const send = (event: FormEvent) => {
    event.preventDefault();
    const found = faultOfNewPassword(password);
    setFault(found);
    if (!found) make.mutate();
  };
  return (
    <form className="gate-form" onSubmit={send}>
      {!token && (
        <ErrorState
          error={
            new ApiProblem(
              0,
              'no-token',
              'The link is incomplete',
              'Open it again from the mail or from the output of the service.',
            )
          }
        />
      )}
      {problem && <ErrorState error={problem} fields={fields} />}
      {first && (
        <>
          <FormField name="name" label="Your name" required problem={problem}>
            <Input
              size="large"
              autoComplete="name"
              value={name}
              onChange={(_, data) => setName(data.value)}
            />
          </FormField>
          <FormField name="email" label="E-mail" required problem={problem}>
            <Input
              type="email"
              size="large"
              autoComplete="username"
              value={email}
              onChange={(_, data) => setEmail(data.value)}
            />
          </FormField>
        </>
      )}
      <NewPasswordField {...{ password, fault, problem }} label="Password" onChange={setPassword} />
      <Button type="submit" appearance="primary" size="large" disabled={make.isPending || !token}>
        {first ? 'Make the first administrator' : 'Join'}
      </Button>
    </form>
  );
}
