import type { DecisionAction } from '../screening/decisions';
import { problems } from '../errors';
import { atLeast, type Role } from './roles';
import { membershipIn, type Viewer } from './viewer';

/** What can be done in a group, and the least role that may do it. */
export const leastRole = {
  read: 'viewer',
  upload: 'analyst',
  analyse: 'analyst',
  tag: 'analyst',
  nominate: 'analyst',
  decide: 'lead',
  defineCampaign: 'lead',
} as const satisfies Record<string, Role>;

export type Permission = keyof typeof leastRole;

export function can(role: Role, permission: Permission): boolean {
  return atLeast(role, leastRole[permission]);
}

/** The permission that a decision takes: an analyst nominates, a lead decides. */
export function permissionFor(action: DecisionAction): Permission {
  return action === 'nominate' ? 'nominate' : 'decide';
}

/** @throws Problem 401 when nobody is signed in. */
export function requireViewer(viewer: Viewer | null): Viewer {
  if (!viewer) throw problems.notSignedIn();
  return viewer;
}

/**
 * @throws Problem 404 when the viewer is not in the group, just as if it did not exist; 403 when the
 * role there is too low.
 */
export function requirePermission(viewer: Viewer, groupId: string, permission: Permission): Role {
  const membership = membershipIn(viewer, groupId);
  if (!membership) throw problems.notFound();
  if (!can(membership.role, permission)) throw problems.notAllowed(leastRole[permission]);
  return membership.role;
}
