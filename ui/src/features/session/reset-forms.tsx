import { Button, Input } from '@fluentui/react-components';
import { useMutation } from '@tanstack/react-query';
import { useState, type FormEvent } from 'react';
import { useNavigate } from 'react-router-dom';
import { ApiProblem } from '../../shared/api/api-problem';
import { ErrorState } from '../../shared/feedback/error-state';
import { FormField } from '../../shared/form/form-field';
import { NewPasswordField, faultOfNewPassword } from './new-password-field';
import { askForReset, confirmReset } from './queries';

const changed = 'The password is changed and all sessions are ended. Sign in with the new one.';

/** Asks for a mail with a link; the answer is the same whether or not the address is known. */
export function AskForReset({ onBack }: { onBack: () => void }) {
  const [email, setEmail] = useState('');
  const ask = useMutation({ mutationFn: askForReset });
  const problem = ask.error instanceof ApiProblem ? ask.error : null;
  const send = (event: FormEvent) => {
    event.preventDefault();
    ask.mutate(email.trim());
  };
  return (
    <form className="gate-form" onSubmit={send}>
      {problem && <ErrorState error={problem} fields={['email']} />}
      {ask.isSuccess && (
        <p role="status">If the address belongs to an account, a mail with a link is on its way.</p>
      )}
      <FormField name="email" label="E-mail" required problem={problem}>
        <Input
          type="email"
          size="large"
          autoComplete="username"
          value={email}
          onChange={(_, data) => setEmail(data.value)}
        />
      </FormField>
      <Button type="submit" appearance="primary" size="large" disabled={ask.isPending}>
        Send the link
      </Button>
      <Button onClick={onBack}>Back to sign-in</Button>
    </form>
  );
}

export function ConfirmReset({ token }: { token: string }) {
  const [password, setPassword] = useState('');
  const [fault, setFault] = useState<string>();
  const navigate = useNavigate();
  const confirm = useMutation({
    mutationFn: confirmReset,
    onSuccess: ({ email }) => navigate('/sign-in', { replace: true, state: { email, done: changed } }),
  });
  const problem = confirm.error instanceof ApiProblem ? confirm.error : null;
  const send = (event: FormEvent) => {
    event.preventDefault();
    const found = faultOfNewPassword(password);
    setFault(found);
    if (!found) confirm.mutate({ token, password });
  };
  return (
    <form className="gate-form" onSubmit={send}>
      {problem && <ErrorState error={problem} fields={['password']} />}
      <NewPasswordField {...{ password, fault, problem }} onChange={setPassword} />
      <Button type="submit" appearance="primary" size="large" disabled={confirm.isPending}>
        Change the password
      </Button>
    </form>
  );
}
