import { SCOPES, type Scope } from '@siltlight/common/wire/auth';
import { Button, Checkbox, Input, SpinButton } from '@fluentui/react-components';
import { Copy20Regular, Key20Regular } from '@fluentui/react-icons';
import { useMutation, useQueryClient } from '@tanstack/react-query';
import { useState, type FormEvent } from 'react';
import { ApiProblem } from '../../shared/api/api-problem';
import { useHasRole } from '../../shared/api/session';
import { ErrorState } from '../../shared/feedback/error-state';
import { useSay } from '../../shared/feedback/toasts';
import { FormField } from '../../shared/form/form-field';
import { makeToken, tokensQuery } from './queries';

const scopeMeans: Record<Scope, string> = {
  read: 'read: fetch what you may see',
  write: 'write: change what you may change; it does not read',
  admin: 'admin: what only administrators do',
};

/** Makes a token for scripts; it is shown once. */
export function TokenForm() {
  const client = useQueryClient();
  const isAdministrator = useHasRole('administrator');
  const [name, setName] = useState('');
  const [scopes, setScopes] = useState<Scope[]>(['read']);
  const [days, setDays] = useState(90);
  const [password, setPassword] = useState('');
  const make = useMutation({
    mutationFn: makeToken,
    onSuccess: async () => {
      setName('');
      setPassword('');
      await client.invalidateQueries({ queryKey: tokensQuery.queryKey });
    },
  });
  const problem = make.error instanceof ApiProblem ? make.error : null;
  const passwordAsked = problem?.code === 'password-needed' || password !== '';
  const send = (event: FormEvent) => {
    event.preventDefault();
    make.mutate({ name, scopes, expiresInDays: days, ...(password ? { password } : {}) });
  };
  const tick = (scope: Scope, on: boolean) =>
    setScopes(on ? [...scopes, scope] : scopes.filter((one) => one !== scope));
  return (
    <form className="people-form" onSubmit={send}>
      {make.data && <Shown token={make.data.token} />}
      {problem && <ErrorState error={problem} fields={['name', 'scopes', 'expiresInDays', 'password']} />}
      <FormField name="name" label="What it is for" required problem={problem}>
        <Input value={name} placeholder="Nightly export" onChange={(_, data) => setName(data.value)} />
      </FormField>
      <FormField name="scopes" label="Scopes" problem={problem}>
        <div role="group" aria-label="Scopes">
          {SCOPES.filter((scope) => scope !== 'admin' || isAdministrator).map((scope) => (
            <div key={scope}>
              <Checkbox
                label={scopeMeans[scope]}
                checked={scopes.includes(scope)}
                onChange={(_, data) => tick(scope, data.checked === true)}
              />
            </div>
          ))}
        </div>
      </FormField>
      <FormField name="expiresInDays" label="Ends after, days" problem={problem}>
        <SpinButton
          min={1}
          max={365}
          value={days}
          onChange={(_, data) => setDays(data.value ?? (Number(data.displayValue) || days))}
        />
      </FormField>
      {passwordAsked && (
        <FormField name="password" label="Your password" required problem={problem}>
          <Input
            type="password"
            autoComplete="current-password"
            value={password}
            onChange={(_, data) => setPassword(data.value)}
          />
        </FormField>
      )}
      <div>
        <Button type="submit" icon={<Key20Regular />} disabled={make.isPending}>
          Make a token
        </Button>
      </div>
    </form>
  );
}

function Shown({ token }: { token: string }) {
  const say = useSay();
  const copy = () =>
    navigator.clipboard.writeText(token).then(
      () => say('Copied'),
      () => say('The browser refused to copy', 'Mark the token and copy it by hand.', 'warning'),
    );
  return (
    <div className="token-shown" role="status">
      <p>
        <b>Your new token.</b> Copy it now: it is not shown again, only its hash is kept.
      </p>
      <code>{token}</code>
      <Button size="small" icon={<Copy20Regular />} onClick={() => void copy()}>
        Copy
      </Button>
    </div>
  );
}
