import { useId } from 'react';
import { Checkbox } from '@/components/ui/Checkbox';
import { ROLES, type Role } from '@/lib/access';

const MEANS: Readonly<Record<Role, string>> = {
  engineer: 'reads sheets and hands readings in',
  librarian: 'reads, and decides on the readings of others',
  designer: 'finds modules for a duty',
  administrator: 'manages the team, sees outbox and trail',
};

/** The four roles to tick, each with what it may do. */
export function RoleBoxes({
  roles,
  onChange,
  error,
}: {
  roles: readonly Role[];
  onChange: (roles: Role[]) => void;
  error?: string | undefined;
}) {
  const id = useId();
  const toggle = (role: Role, on: boolean) => onChange(ROLES.filter((each) => (each === role ? on : roles.includes(each))));
  return (
    <fieldset className="field" aria-describedby={error ? id : undefined}>
      <legend className="label">Roles</legend>
      {ROLES.map((role) => (
        <Checkbox key={role} name="roles" isSelected={roles.includes(role)} onChange={(on) => toggle(role, on)}>
          {role} <span className="muted">{MEANS[role]}</span>
        </Checkbox>
      ))}
      {error && (
        <span id={id} className="error">
          {error}
        </span>
      )}
    </fieldset>
  );
}
