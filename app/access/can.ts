/** What a person is to one coach. `owner` may do all; the others are given by an owner. */
export const roles = ['owner', 'driver', 'helper', 'viewer'] as const;
export type Role = (typeof roles)[number];

/** What can be done to a coach, named after the columns of the table in the contributor guide. */
export const actions = [
  'coach:see',
  'log:see',
  'fill:see',
  'fill:tap',
  'round:run',
  'records:edit',
  'people:edit',
] as const;
export type Action = (typeof actions)[number];

/** Somebody who asks: signed in, with the roles that are in force now. */
export interface Actor {
  readonly userId: string;
  readonly roles: ReadonlyMap<string, Role>;
}

/** What of a coach decides about access. */
export interface AccessSubject {
  readonly id: string;
  /** A round is under way: only then does a helper see anything. */
  readonly roundOpen: boolean;
}

const allowed: Record<Role, readonly Action[]> = {
  owner: actions,
  driver: ['coach:see', 'log:see', 'fill:see', 'fill:tap', 'round:run'],
  helper: ['coach:see', 'fill:see', 'fill:tap'],
  viewer: ['coach:see', 'log:see', 'fill:see'],
};

/**
 * Whether `actor` may do `action` to `coach`. The only place that decides it.
 * Nobody signed in (`null`) and nobody without a membership may do anything.
 */
export function can(actor: Actor | null, action: Action, coach: AccessSubject): boolean {
  const role = actor?.roles.get(coach.id);
  if (!role) return false;
  if (role === 'helper' && !coach.roundOpen) return false;
  return allowed[role].includes(action);
}
