import { Gate } from '../features/session/gate';
import { NewAccountForm } from '../features/session/new-account-form';
import { useLinkToken } from '../features/session/use-link-token';

export default function AcceptInvitation() {
  const token = useLinkToken();
  return (
    <Gate title="Accept the invitation" lead="Choose a password to join your colleagues at the desk.">
      <NewAccountForm token={token} first={false} />
    </Gate>
  );
}
