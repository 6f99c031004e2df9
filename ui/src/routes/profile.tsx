import type { QueryClient } from '@tanstack/react-query';
import { MeForm } from '../features/profile/me-form';
import { PasswordForm } from '../features/profile/password-form';
import { meQuery, sessionsQuery, tokensQuery } from '../features/profile/queries';
import { SessionsTable } from '../features/profile/sessions-table';
import { TokenForm } from '../features/profile/token-form';
import { TokensTable } from '../features/profile/tokens-table';
import { Figure } from '../shared/figure/figure';
import { Page } from '../shared/page/page';
import '../features/profile/profile.css';

export const loader = (client: QueryClient) => () =>
  Promise.all([
    client.ensureQueryData(meQuery),
    client.ensureQueryData(sessionsQuery),
    client.ensureQueryData(tokensQuery),
  ]);

export default function Profile() {
  return (
    <Page title="Profile and tokens" crumbs={[{ label: 'Profile' }]}>
      <div className="profile">
        <div>
          <Figure plain title="You">
            <MeForm />
          </Figure>
          <Figure plain title="Password">
            <PasswordForm />
          </Figure>
        </div>
        <div>
          <Figure plain title="Access tokens" sub="for scripts, sent as Authorization: Bearer">
            <TokensTable />
            <TokenForm />
          </Figure>
          <Figure plain title="Sessions" sub="where you are signed in">
            <SessionsTable />
          </Figure>
        </div>
      </div>
    </Page>
  );
}
