import { Gate } from '../features/session/gate';
import { ConfirmReset } from '../features/session/reset-forms';
import { useLinkToken } from '../features/session/use-link-token';

export default function ResetPassword() {
  const token = useLinkToken();
  return (
    <Gate
      title="Choose a new password"
      lead="The link from the mail works once. All your sessions end with the change."
    >
      <ConfirmReset token={token} />
    </Gate>
  );
}
