import { endpoints, may, permissions, permissionTable, roles } from './index.js';

describe('the permission table', () => {
  it('gives the owner everything and a buyer nothing of the workshop', () => {
    for (const permission of permissions) {
      expect(may('owner', permission)).toBe(true);
      expect(may('buyer', permission)).toBe(false);
    }
  });

  it('keeps money from the helper and kits from the bookkeeper', () => {
    expect(may('helper', 'orders:read')).toBe(false);
    expect(may('helper', 'orders:refund')).toBe(false);
    expect(may('helper', 'coupons:read')).toBe(false);
    expect(may('helper', 'supporters:read')).toBe(false);
    expect(may('bookkeeper', 'plans:write')).toBe(false);
    expect(may('bookkeeper', 'kits:write')).toBe(false);
    expect(may('bookkeeper', 'revisions:release')).toBe(false);
    expect(may('bookkeeper', 'orders:read')).toBe(true);
  });

  it('names only known roles', () => {
    for (const allowed of Object.values(permissionTable))
      for (const role of allowed) expect(roles).toContain(role);
  });

  it('is what every workshop route is guarded by', () => {
    for (const [key, { access }] of Object.entries(endpoints))
      if (key.includes(' /workshop/')) expect(permissions).toContain(access);
  });
});
