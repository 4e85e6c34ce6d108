import { useState } from 'react';
import { ApiProblem, api } from '@/components/islands/api';
import type { Role } from '@/lib/access';
import type { AddedPerson, AddPersonBody, Member } from '@/lib/contracts';

/** A refusal: a sentence, and one for each field that is wrong. */
export interface Refused {
  readonly detail: string;
  readonly fields: Readonly<Record<string, string>>;
}

const byName = (a: Member, b: Member) => a.name.localeCompare(b.name, 'en');

/** The team as it stands, and what can be done to it. Every action answers what was refused, or null. */
export function useTeam(first: readonly Member[]) {
  const [people, setPeople] = useState(first);
  const [busy, setBusy] = useState<string | null>(null);
  const [said, setSaid] = useState('');
  const [fault, setFault] = useState<string | null>(null);

  const put = (person: Member) => setPeople((now) => [...now.filter(({ id }) => id !== person.id), person].sort(byName));

  async function attempt<T>(key: string, work: () => Promise<T>, done: (value: T) => void): Promise<Refused | null> {
    setBusy(key);
    setFault(null);
    setSaid('');
    try {
      done(await work());
      return null;
    } catch (error) {
      if (!(error instanceof ApiProblem)) throw error;
      return { detail: error.detail, fields: error.fields };
    } finally {
      setBusy(null);
    }
  }

  const add = (body: AddPersonBody, told: (added: AddedPerson) => void) =>
    attempt(
      'add',
      () => api.post<AddedPerson>('/api/people', body),
      (added) => {
        put(added.person);
        told(added);
      },
    );

  const changeRoles = (person: Member, roles: readonly Role[]) =>
    attempt(
      person.id,
      () => api.put<Member>(`/api/people/${person.id}/roles`, { roles }),
      (changed) => {
        put(changed);
        setSaid(`${changed.name} is ${changed.roles.join(' and ')} now.`);
      },
    );

  const setDisabled = async (person: Member, disabled: boolean) => {
    const refused = await attempt(
      person.id,
      () => api.post<Member>(`/api/people/${person.id}/${disabled ? 'disable' : 'enable'}`),
      (changed) => {
        put(changed);
        setSaid(disabled ? `${changed.name} is disabled, and all their sessions have ended.` : `${changed.name} can sign in again.`);
      },
    );
    if (refused) setFault(refused.detail);
  };

  return { people, busy, said, fault, add, changeRoles, setDisabled };
}

export type Team = ReturnType<typeof useTeam>;
