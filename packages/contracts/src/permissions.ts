/** Roles of an account. Supporter and tester are facts about a person, not roles. */
export const roles = ['buyer', 'helper', 'bookkeeper', 'maker', 'owner'] as const;
export type Role = (typeof roles)[number];

/**
 * The permission table: what each kind of work needs, and which roles may do it. The API's guard and
 * the web's menus read this one table.
 */
export const permissionTable = {
  'workshop:enter': ['helper', 'bookkeeper', 'maker', 'owner'],
  'kits:read': ['helper', 'bookkeeper', 'maker', 'owner'],
  'kits:write': ['maker', 'owner'],
  'prices:write': ['maker', 'owner'],
  'revisions:write': ['maker', 'owner'],
  'revisions:release': ['maker', 'owner'],
  'coupons:read': ['bookkeeper', 'maker', 'owner'],
  'coupons:write': ['maker', 'owner'],
  'orders:read': ['bookkeeper', 'maker', 'owner'],
  'orders:refund': ['bookkeeper', 'owner'],
  'ledger:read': ['bookkeeper', 'owner'],
  'tax:write': ['bookkeeper', 'owner'],
  'supporters:read': ['bookkeeper', 'maker', 'owner'],
  'plans:write': ['maker', 'owner'],
  'buyers:read': ['helper', 'bookkeeper', 'maker', 'owner'],
  'links:resend': ['helper', 'bookkeeper', 'maker', 'owner'],
  'fit:read': ['helper', 'maker', 'owner'],
  'fit:answer': ['helper', 'maker', 'owner'],
  'journal:write': ['helper', 'maker', 'owner'],
  'journal:publish': ['maker', 'owner'],
  'letters:read': ['helper', 'maker', 'owner'],
  'letters:write': ['helper', 'maker', 'owner'],
  'letters:send': ['maker', 'owner'],
  'people:read': ['owner'],
  'people:write': ['owner'],
  'log:read': ['owner'],
} as const satisfies Record<string, readonly Role[]>;

export type Permission = keyof typeof permissionTable;
export const permissions = Object.keys(permissionTable) as Permission[];

export const may = (role: Role, permission: Permission): boolean =>
  (permissionTable[permission] as readonly Role[]).includes(role);

export const permissionsOf = (role: Role): Permission[] => permissions.filter((one) => may(role, one));

export const isStaff = (role: Role): boolean => role !== 'buyer';
