import type { Role } from '@windchest/contracts';

export const workshopTexts = {
  skip: 'Skip to the page',
  name: 'Workshop',
  navigation: 'Workshop',
  menu: 'Menu',
  closeMenu: 'Close the menu',
  overview: 'Overview',
  kits: 'Kits',
  orders: 'Orders',
  receipts: 'Receipts',
  ledger: 'Ledger',
  coupons: 'Coupons',
  supporters: 'Supporters',
  holders: 'Holders',
  fit: 'Fit',
  journal: 'Journal',
  people: 'People',
  toShop: 'To the shop',
  footer: 'About the workshop',
  roles: {
    buyer: 'Buyer',
    helper: 'Helper',
    bookkeeper: 'Bookkeeper',
    maker: 'Maker',
    owner: 'Owner',
  } satisfies Record<Role, string>,
};
