import { useState } from 'react';
import { Button } from '@/components/ui/Button';
import { chipClass } from '@/components/ui/chip-tones';
import { ErrorBoundary } from '@/components/ui/ErrorBoundary';
import { formatDate } from '@/components/when';
import type { Member } from '@/lib/contracts';
import { AddPersonDialog } from './AddPersonDialog';
import { RolesDialog } from './RolesDialog';
import { useTeam, type Team } from './use-team';

interface TeamTableProps {
  readonly people: readonly Member[];
  /** Who looks at it: nobody disables themselves. */
  readonly self: string;
}

function Row({ person, self, team, onRoles }: { person: Member; self: string; team: Team; onRoles: () => void }) {
  const isSelf = person.id === self;
  return (
    <tr>
      <th scope="row">
        {person.name}
        {isSelf && <span className="muted font-normal"> (you)</span>}
        <br />
        <span className="muted font-normal">{person.email}</span>
      </th>
      <td data-label="Roles">{person.roles.join(', ')}</td>
      <td>
        <span className={chipClass(person.disabled ? 'quiet' : 'approved')}>{person.disabled ? 'disabled' : 'may sign in'}</span>
      </td>
      <td data-label="Since">{formatDate(person.since)}</td>
      <td>
        <span className="flex flex-wrap gap-2 sm:justify-end">
          <Button size="small" onPress={onRoles} aria-label={`Change roles of ${person.name}`}>
            Change roles
          </Button>
          {!isSelf && (
            <Button
              size="small"
              isPending={team.busy === person.id}
              onPress={() => void team.setDisabled(person, !person.disabled)}
              aria-label={`${person.disabled ? 'Enable' : 'Disable'} ${person.name}`}
            >
              {person.disabled ? 'Enable' : 'Disable'}
            </Button>
          )}
        </span>
      </td>
    </tr>
  );
}

function Table({ people, self }: TeamTableProps) {
  const team = useTeam(people);
  const [open, setOpen] = useState<Member | 'add' | null>(null);
  const close = () => setOpen(null);
  return (
    <>
      <div className="mb-3 flex flex-wrap items-center gap-3">
        <Button variant="primary" onPress={() => setOpen('add')}>
          Add a person
        </Button>
        <span role="status" aria-atomic="true">
          {team.said}
        </span>
      </div>
      {team.fault && (
        <p className="notice notice-attention mb-3" role="alert">
          {team.fault}
        </p>
      )}
      <div className="sheet table-scroll">
        <table className="table stacked">
          <caption>Disabling ends all sessions of a person; what they made stays.</caption>
          <thead>
            <tr>
              <th scope="col">Person</th>
              <th scope="col">Roles</th>
              <th scope="col">State</th>
              <th scope="col">Since</th>
              <th scope="col">
                <span className="sr-only">What can be done</span>
              </th>
            </tr>
          </thead>
          <tbody>
            {team.people.map((person) => (
              <Row key={person.id} person={person} self={self} team={team} onRoles={() => setOpen(person)} />
            ))}
          </tbody>
        </table>
      </div>
      {open === 'add' && <AddPersonDialog team={team} onClose={close} />}
      {open !== null && open !== 'add' && <RolesDialog person={open} team={team} onClose={close} />}
    </>
  );
}

/** The team with what an administrator can do about it. */
export const TeamTable = (props: TeamTableProps) => (
  <ErrorBoundary>
    <Table {...props} />
  </ErrorBoundary>
);
