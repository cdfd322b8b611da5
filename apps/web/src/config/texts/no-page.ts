/** Where nothing stands, or nobody may enter. */
export const noPageTexts = {
  notFound: 'Nothing stands at this address',
  notFoundDetail: 'The link may be old or cut off. The kits are all on the front page.',
  toKits: 'See the kits',
  forbidden: 'This room is for the workshop’s staff',
  forbiddenDetail: 'Sign in with an account that may enter it, or ask the owner.',
};
