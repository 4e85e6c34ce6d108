export const ROLES = ['engineer', 'librarian', 'designer', 'administrator'] as const;
export type Role = (typeof ROLES)[number];

/** Narrows a stored or posted word to a role. */
export const isRole = (word: string): word is Role => (ROLES as readonly string[]).includes(word);

/** Who asks. `id` is a person's id; roles may be several. */
export interface Actor {
  readonly id: string;
  readonly roles: readonly Role[];
}

/** Everything that can be asked for. A name is a verb and the kind of thing it is done to. */
export type Action =
  | 'account.use'
  | 'sheet.see'
  | 'sheet.upload'
  | 'sheet.edit'
  | 'module.create'
  | 'module.edit'
  | 'reading.see'
  | 'reading.start'
  | 'reading.edit'
  | 'reading.handIn'
  | 'reading.takeBack'
  | 'reading.decide'
  | 'review.see'
  | 'catalogue.see'
  | 'duty.search'
  | 'team.manage'
  | 'trail.see'
  | 'outbox.see';

/** What an action is done to, as far as the rule needs to know it. */
export interface Access {
  /** Person who owns the reading. */
  readonly ownerId?: string | undefined;
  /** People who have edited or handed in the reading. */
  readonly editorIds?: readonly string[] | undefined;
  /** True where what is asked for belongs to an approved, superseded or withdrawn reading. */
  readonly approved?: boolean | undefined;
}

type Rule = (actor: Actor, object: Access) => boolean;

const anyOf =
  (...roles: Role[]): Rule =>
  (actor) =>
    actor.roles.some((role) => roles.includes(role));
const both =
  (...rules: Rule[]): Rule =>
  (actor, object) =>
    rules.every((rule) => rule(actor, object));
const either =
  (...rules: Rule[]): Rule =>
  (actor, object) =>
    rules.some((rule) => rule(actor, object));

const anyone: Rule = (actor) => actor.roles.length > 0;
const reads = anyOf('engineer', 'librarian');
const designs = anyOf('engineer', 'librarian', 'designer');
const owns: Rule = (actor, object) => object.ownerId === undefined || object.ownerId === actor.id;
const approved: Rule = (_actor, object) => object.approved === true;
const notOwnWork: Rule = (actor, object) => object.ownerId !== actor.id && !object.editorIds?.includes(actor.id);

const RULES: Readonly<Record<Action, Rule>> = {
  'account.use': anyone,
  'sheet.see': either(reads, both(anyone, approved)),
  'sheet.upload': reads,
  'sheet.edit': reads,
  'module.create': reads,
  'module.edit': anyOf('librarian'),
  'reading.see': either(reads, both(anyone, approved)),
  'reading.start': reads,
  'reading.edit': both(reads, owns),
  'reading.handIn': both(reads, owns),
  'reading.takeBack': both(reads, owns),
  'reading.decide': both(anyOf('librarian'), notOwnWork),
  'review.see': anyOf('librarian'),
  'catalogue.see': anyone,
  'duty.search': designs,
  'team.manage': anyOf('administrator'),
  'trail.see': anyOf('administrator'),
  'outbox.see': anyOf('administrator'),
};

/**
 * May this person do this? The matrix of who may do what; denied unless a rule allows it.
 * Without `object` it answers for the kind of thing ("could this person ever"), which is what hiding
 * a link needs; with it, for one thing, which is what every use case asks.
 *
 * @param actor who asks, or null when nobody is signed in: always denied
 * @param action what is asked for
 * @param object owner, editors and approval of the thing, where the rule depends on them
 */
export function can(actor: Actor | null, action: Action, object: Access = {}): boolean {
  return actor !== null && RULES[action](actor, object);
}
