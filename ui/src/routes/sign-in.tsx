import type { QueryClient } from '@tanstack/react-query';
import { useState } from 'react';
import { redirect, type LoaderFunction } from 'react-router-dom';
import { Gate } from '../features/session/gate';
import { localPath } from '../features/session/local-path';
import { AskForReset } from '../features/session/reset-forms';
import { SignInForm } from '../features/session/sign-in-form';
import { sessionQuery } from '../shared/api/session';

/** Whoever is signed in already goes on to where they wanted. */
export const loader =
  (client: QueryClient): LoaderFunction =>
  async ({ request }) => {
    const session = await client.ensureQueryData(sessionQuery);
    return session.person ? redirect(localPath(new URL(request.url).searchParams.get('next'))) : null;
  };

const lead =
  'From a spreadsheet of dust to a forcing with its uncertainty, each number traceable to its cell.';

export default function SignIn() {
  const [asking, setAsking] = useState(false);
  return (
    <Gate title={asking ? 'Forgotten password' : 'Sign in'} lead={lead}>
      {asking ? (
        <AskForReset onBack={() => setAsking(false)} />
      ) : (
        <SignInForm onForgotten={() => setAsking(true)} />
      )}
    </Gate>
  );
}
