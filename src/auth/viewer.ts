import type { Role } from './roles';

/** A person's place in one group, as the database has it at this request. */
export interface Membership {
  groupId: string;
  groupName: string;
  role: Role;
}

/** Who is asking. */
export interface Viewer {
  userId: string;
  name: string;
  email: string;
  /** A token sees only the group that it was made for. */
  memberships: Membership[];
  via: 'session' | 'token';
}

/** The groups the viewer is in. */
export function groupIdsOf(viewer: Viewer): string[] {
  return viewer.memberships.map((membership) => membership.groupId);
}

export function membershipIn(viewer: Viewer, groupId: string): Membership | null {
  return viewer.memberships.find((membership) => membership.groupId === groupId) ?? null;
}
