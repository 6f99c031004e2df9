import { Gate } from '../features/session/gate';
import { NewAccountForm } from '../features/session/new-account-form';
import { useLinkToken } from '../features/session/use-link-token';

export default function FirstAdministrator() {
  const token = useLinkToken();
  return (
    <Gate
      title="First administrator"
      lead="This installation is empty. Whoever holds the link from its output becomes its administrator."
    >
      <NewAccountForm token={token} first />
    </Gate>
  );
}
