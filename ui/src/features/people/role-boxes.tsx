import { ROLES, type Role } from '@siltlight/common/wire/people';
import { Checkbox } from '@fluentui/react-components';

type Props = { roles: readonly Role[]; onChange: (roles: Role[]) => void; disabled?: boolean };

const mayDo: Record<Role, string> = {
  scientist: 'submits spreadsheets, builds fields, runs estimates',
  steward: 'vets submissions, publishes and withdraws versions',
  modeller: 'finds published estimates and exports them',
  administrator: 'invites people, gives roles, watches the service',
};

/** Roles as boxes, each with what it allows; a person may hold several. */
export function RoleBoxes({ roles, onChange, disabled }: Props) {
  return (
    <div role="group" aria-label="Roles">
      {ROLES.map((role) => (
        <div key={role}>
          <Checkbox
            disabled={disabled}
            checked={roles.includes(role)}
            label={`${role}: ${mayDo[role]}`}
            onChange={(_, data) =>
              onChange(data.checked ? [...roles, role] : roles.filter((one) => one !== role))
            }
          />
        </div>
      ))}
    </div>
  );
}
