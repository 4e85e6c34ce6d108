import { useState } from 'react';
import { Button } from '@/components/ui/Button';
import { Dialog } from '@/components/ui/Dialog';
import type { Member } from '@/lib/contracts';
import { RoleBoxes } from './RoleBoxes';
import type { Team } from './use-team';

/** Changes what one person may do. */
export function RolesDialog({ person, team, onClose }: { person: Member; team: Team; onClose: () => void }) {
  const [roles, setRoles] = useState(person.roles);
  const [error, setError] = useState<string>();
  const save = async () => {
    const refused = await team.changeRoles(person, roles);
    if (refused) setError(refused.fields.roles ?? refused.detail);
    else onClose();
  };
  return (
    <Dialog
      title={`Roles of ${person.name}`}
      isOpen
      onClose={onClose}
      actions={
        <>
          <Button onPress={onClose}>Leave as it was</Button>
          <Button variant="primary" isPending={team.busy === person.id} onPress={() => void save()}>
            Save roles
          </Button>
        </>
      }
    >
      <RoleBoxes roles={roles} onChange={setRoles} error={error} />
      <p className="hint mt-2">They count from {person.name}’s next step on.</p>
    </Dialog>
  );
}
