import { can, type Action, type Actor } from '@/lib/access';

export type Section = 'today' | 'sheets' | 'review' | 'catalogue' | 'duty' | 'team' | 'outbox' | 'trail' | 'account';

interface Entry {
  readonly section: Section;
  readonly label: string;
  readonly href: string;
  readonly needs: Action;
}

const ENTRIES: readonly Entry[] = [
  { section: 'today', label: 'Today', href: '/', needs: 'account.use' },
  { section: 'sheets', label: 'Sheets', href: '/sheets', needs: 'sheet.upload' },
  { section: 'review', label: 'Review', href: '/review', needs: 'review.see' },
  { section: 'catalogue', label: 'Catalogue', href: '/catalogue', needs: 'catalogue.see' },
  { section: 'duty', label: 'Duty', href: '/duty', needs: 'duty.search' },
  { section: 'team', label: 'Team', href: '/admin/team', needs: 'team.manage' },
  { section: 'outbox', label: 'Outbox', href: '/admin/outbox', needs: 'outbox.see' },
  { section: 'trail', label: 'Trail', href: '/admin/trail', needs: 'trail.see' },
];

/** The screens a person may go to, in the order of the job. */
export const sectionsFor = (actor: Actor | null): readonly Entry[] => ENTRIES.filter((entry) => can(actor, entry.needs));
