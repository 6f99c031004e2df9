import { newPassword, PASSWORD_MIN_CHARACTERS } from '@siltlight/common/wire/auth';
import { Input } from '@fluentui/react-components';
import type { ApiProblem } from '../../shared/api/api-problem';
import { FormField } from '../../shared/form/form-field';

/** What is wrong with a new password, by the same rule that the service applies. */
export const faultOfNewPassword = (password: string) =>
  newPassword.safeParse(password).error?.issues[0]?.message;

type Props = {
  name?: string;
  label?: string;
  password: string;
  fault?: string;
  problem?: ApiProblem | null;
  onChange: (password: string) => void;
};

export function NewPasswordField({
  name = 'password',
  label = 'New password',
  password,
  fault,
  problem,
  onChange,
}: Props) {
  return (
    <FormField
      name={name}
      label={label}
      required
      problem={problem}
      fault={fault}
      hint={`At least ${PASSWORD_MIN_CHARACTERS} characters; several unrelated words do well. Pasting is fine.`}
    >
      <Input
        type="password"
        size="large"
        autoComplete="new-password"
        value={password}
        onChange={(_, data) => onChange(data.value)}
      />
    </FormField>
  );
}
