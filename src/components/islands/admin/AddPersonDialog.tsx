import { useState } from 'react';
import { Button } from '@/components/ui/Button';
import { Dialog } from '@/components/ui/Dialog';
import { ErrorSummary } from '@/components/ui/ErrorSummary';
import { TextField } from '@/components/ui/TextField';
import type { Role } from '@/lib/access';
import type { AddedPerson } from '@/lib/contracts';
import { RoleBoxes } from './RoleBoxes';
import type { Refused, Team } from './use-team';

interface FormProps {
  team: Team;
  onAdded: (added: AddedPerson) => void;
  onClose: () => void;
}

/** Everything that was refused, in the order of the form. */
function problemsOf(refused: Refused | null) {
  if (!refused) return [];
  const inForm = (['name', 'email', 'roles'] as const).flatMap((field) => {
    const message = refused.fields[field];
    return message === undefined ? [] : [{ field, message }];
  });
  return inForm.length > 0 ? inForm : [{ field: null, message: refused.detail }];
}

function AddForm({ team, onAdded, onClose }: FormProps) {
  const [email, setEmail] = useState('');
  const [name, setName] = useState('');
  const [roles, setRoles] = useState<Role[]>([]);
  const [refused, setRefused] = useState<Refused | null>(null);
  const fields = refused?.fields ?? {};
  return (
    <form
      noValidate
      className="flex flex-col gap-3"
      onSubmit={async (event) => {
        event.preventDefault();
        setRefused(await team.add({ email, name, roles }, onAdded));
      }}
    >
      <ErrorSummary problems={problemsOf(refused)} title="Nobody was added" />
      <TextField label="Name" name="name" autoComplete="off" value={name} onChange={setName} error={fields.name} />
      <TextField
        label="E-mail address"
        name="email"
        type="email"
        autoComplete="off"
        description="They sign in with it, and mail goes there."
        value={email}
        onChange={setEmail}
        error={fields.email}
      />
      <RoleBoxes roles={roles} onChange={setRoles} error={fields.roles} />
      <div className="flex flex-wrap justify-end gap-2">
        <Button onPress={onClose}>Cancel</Button>
        <Button variant="primary" type="submit" isPending={team.busy === 'add'}>
          Add
        </Button>
      </div>
    </form>
  );
}

function Told({ added, onClose }: { added: AddedPerson; onClose: () => void }) {
  const [copied, setCopied] = useState(false);
  const copy = () =>
    navigator.clipboard.writeText(added.password).then(
      () => setCopied(true),
      () => setCopied(false),
    );
  return (
    <div className="flex flex-col gap-3">
      <p>
        {added.person.name} can sign in as <b>{added.person.email}</b> with this password. It is shown this once and kept nowhere: hand it
        over now.
      </p>
      <p className="notice">
        <code className="text-base">{added.password}</code>
      </p>
      <p className="hint">It should be changed after the first sign-in, under Account.</p>
      <div className="flex flex-wrap items-center justify-end gap-2">
        <span role="status" className="muted">
          {copied && 'copied'}
        </span>
        <Button onPress={() => void copy()}>Copy</Button>
        <Button variant="primary" onPress={onClose}>
          Done
        </Button>
      </div>
    </div>
  );
}

/** Asks who to add, then tells the password once. */
export function AddPersonDialog({ team, onClose }: { team: Team; onClose: () => void }) {
  const [added, setAdded] = useState<AddedPerson | null>(null);
  return (
    <Dialog title={added ? 'Password, shown this once' : 'Add a person'} isOpen role={added ? 'alertdialog' : 'dialog'} onClose={onClose}>
      {added ? <Told added={added} onClose={onClose} /> : <AddForm team={team} onAdded={setAdded} onClose={onClose} />}
    </Dialog>
  );
}
