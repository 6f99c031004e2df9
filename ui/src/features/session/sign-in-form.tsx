import { Button, Input } from '@fluentui/react-components';
import { useMutation, useQuery } from '@tanstack/react-query';
import { useState, type FormEvent } from 'react';
import { useLocation, useNavigate, useSearchParams } from 'react-router-dom';
import { ApiProblem } from '../../shared/api/api-problem';
import { beginSession } from '../../shared/api/session';
import { ErrorState } from '../../shared/feedback/error-state';
import { FormField } from '../../shared/form/form-field';
import { localPath } from './local-path';
import { signIn, signInOptionsQuery } from './queries';

const fields = ['email', 'password'];

export function SignInForm({ onForgotten }: { onForgotten: () => void }) {
  const navigate = useNavigate();
  const [params] = useSearchParams();
  const arrival = useLocation().state as { email?: string; done?: string } | null;
  const [email, setEmail] = useState(arrival?.email ?? '');
  const [password, setPassword] = useState('');
  const options = useQuery(signInOptionsQuery).data;
  const enter = useMutation({
    mutationFn: signIn,
    onSuccess: async (answer) => {
      beginSession(answer);
      await navigate(localPath(params.get('next')), { replace: true });
    },
  });
  const problem = enter.error instanceof ApiProblem ? enter.error : null;
  const send = (event: FormEvent) => {
    event.preventDefault();
    enter.mutate({ email: email.trim(), password });
  };
  return (
    <form className="gate-form" onSubmit={send}>
      {arrival?.done && !problem && <p role="status">{arrival.done}</p>}
      {problem && <ErrorState error={problem} fields={fields} />}
      <FormField name="email" label="E-mail" required problem={problem}>
        <Input
          type="email"
          size="large"
          autoComplete="username"
          value={email}
          onChange={(_, data) => setEmail(data.value)}
        />
      </FormField>
      <FormField name="password" label="Password" required problem={problem}>
        <Input
          type="password"
          size="large"
          autoComplete="current-password"
          value={password}
          onChange={(_, data) => setPassword(data.value)}
        />
      </FormField>
      <div className="gate-row">
        <button type="button" className="gate-link" onClick={onForgotten}>
          Forgotten?
        </button>
      </div>
      <Button type="submit" appearance="primary" size="large" disabled={enter.isPending}>
        {enter.isPending ? 'Signing in' : 'Sign in'}
      </Button>
      <p className="sl-small sl-muted">
        No account yet? An administrator invites you by mail.
        {options?.demo && ' The demo holds invented data only.'}
      </p>
      {options && options.demoAccounts.length > 0 && (
        <div className="gate-accounts">
          <p className="sl-small sl-muted">
            People of the demo: pick one; the password was printed when the service first started.
          </p>
          <div className="sl-chips">
            {options.demoAccounts.map((account) => (
              <Button
                key={account.email}
                size="small"
                title={account.email}
                onClick={() => setEmail(account.email)}
              >
                {account.name}, {account.roles.join(', ')}
              </Button>
            ))}
          </div>
        </div>
      )}
    </form>
  );
}
