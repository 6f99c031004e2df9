import type { PersonView, Role } from '@siltlight/common/wire/people';
import { Button } from '@fluentui/react-components';
import { useMutation, useQueryClient } from '@tanstack/react-query';
import { useState } from 'react';
import { ConfirmDialog } from '../../shared/feedback/confirm-dialog';
import { ErrorState } from '../../shared/feedback/error-state';
import { useSay } from '../../shared/feedback/toasts';
import { StateTag } from '../../shared/page/state-tag';
import { changePerson, peopleQuery } from './queries';
import { RoleBoxes } from './role-boxes';

/** Roles of one person, and whether they may sign in. */
export function PersonForm({ person }: { person: PersonView }) {
  const client = useQueryClient();
  const say = useSay();
  const [roles, setRoles] = useState<Role[]>(person.roles);
  const [asking, setAsking] = useState(false);
  const change = useMutation({
    mutationFn: changePerson,
    onSuccess: () => say(`${person.name} is changed`, 'Their open sessions know it at once.'),
    onSettled: () => client.invalidateQueries({ queryKey: peopleQuery.queryKey }),
  });
  const disabled = person.state === 'disabled';
  const same = [...roles].sort().join() === [...person.roles].sort().join();
  return (
    <section className="people-form" aria-label={person.name}>
      <p className="sl-row">
        <b>{person.name}</b>
        <StateTag state={person.state} />
      </p>
      <p className="sl-13 sl-muted">{person.email}</p>
      {change.error && <ErrorState error={change.error} kept="What you ticked is still here." />}
      <RoleBoxes roles={roles} onChange={setRoles} />
      <div className="sl-row">
        <Button
          appearance="primary"
          disabled={same || change.isPending}
          onClick={() => change.mutate({ id: person.id, roles, version: person.version })}
        >
          Save the roles
        </Button>
        <Button
          disabled={change.isPending}
          onClick={() =>
            disabled
              ? change.mutate({ id: person.id, disabled: false, version: person.version })
              : setAsking(true)
          }
        >
          {disabled ? 'Enable' : 'Disable'}
        </Button>
      </div>
      <ConfirmDialog
        open={asking}
        title={`Disable ${person.name}?`}
        act="Disable"
        onClose={() => setAsking(false)}
        onAct={() => {
          setAsking(false);
          change.mutate({ id: person.id, disabled: true, version: person.version });
        }}
      >
        Their sessions and tokens end at once. Their name stays beside what they did; they can be enabled
        again.
      </ConfirmDialog>
    </section>
  );
}
