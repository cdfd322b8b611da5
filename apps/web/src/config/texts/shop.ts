export const shopTexts = {
  skip: 'Skip to the page',
  kits: 'Kits',
  shelf: 'My shelf',
  pledge: 'Pledge',
  workshop: 'Workshop',
  signIn: 'Sign in',
  account: 'Account',
  basket: 'Basket',
  basketOf: (count: number) => `Basket · ${count}`,
  basketSpoken: (count: number) =>
    count ? `Basket, ${count} ${count === 1 ? 'kit' : 'kits'}` : 'Basket, empty',
  menu: 'Menu',
  closeMenu: 'Close the menu',
  navigation: 'Shop',
  footer: 'About this shop',
  cautions: 'Cautions',
  journal: 'Journal',
  news: 'News',
  printer: 'My printer',
};

export const colourTexts = {
  legend: 'Colours',
  light: 'Light',
  dark: 'Dark',
  system: 'As the system',
};
