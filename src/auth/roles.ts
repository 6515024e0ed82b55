/** From the least to the most: each role may do all that the ones before it may. */
export const roles = ['viewer', 'analyst', 'lead', 'admin'] as const;
export type Role = (typeof roles)[number];

/** True when `role` may do what `needed` may. */
export function atLeast(role: Role, needed: Role): boolean {
  return roles.indexOf(role) >= roles.indexOf(needed);
}
