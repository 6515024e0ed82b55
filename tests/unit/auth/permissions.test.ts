import { describe, expect, it } from 'vitest';
import {
  can,
  permissionFor,
  requirePermission,
  requireViewer,
} from '../../../src/auth/permissions';
import { roles, type Role } from '../../../src/auth/roles';
import type { Viewer } from '../../../src/auth/viewer';

const viewer = (role: Role): Viewer => ({
  userId: 'u',
  name: 'U',
  email: 'u@lab.example',
  via: 'session',
  memberships: [{ groupId: 'own', groupName: 'Own', role }],
});

describe('permissions', () => {
  it.each([
    [
      'viewer',
      { read: true, upload: false, nominate: false, decide: false, defineCampaign: false },
    ],
    ['analyst', { read: true, upload: true, nominate: true, decide: false, defineCampaign: false }],
    ['lead', { read: true, upload: true, nominate: true, decide: true, defineCampaign: true }],
    ['admin', { read: true, upload: true, nominate: true, decide: true, defineCampaign: true }],
  ] as const)('of a %s are those of the role', (role, expected) => {
    for (const [permission, allowed] of Object.entries(expected)) {
      expect(can(role, permission as keyof typeof expected), permission).toBe(allowed);
    }
  });

  it('let an analyst nominate and leave every other step to a lead', () => {
    expect(permissionFor('nominate')).toBe('nominate');
    for (const action of ['take-to-scale-up', 'wait', 'set-aside', 'reopen'] as const) {
      expect(permissionFor(action)).toBe('decide');
    }
  });

  it('answer for another group as if it did not exist, whatever the role', () => {
    for (const role of roles) {
      expect(() => requirePermission(viewer(role), 'other', 'read')).toThrow(
        expect.objectContaining({ status: 404 }),
      );
    }
  });

  it('refuse a role that is too low with 403 and the role it takes', () => {
    expect(() => requirePermission(viewer('viewer'), 'own', 'upload')).toThrow(
      expect.objectContaining({
        status: 403,
        detail: expect.stringContaining('analyst') as string,
      }),
    );
  });

  it('refuse somebody who is not signed in with 401', () => {
    expect(() => requireViewer(null)).toThrow(expect.objectContaining({ status: 401 }));
  });
});
