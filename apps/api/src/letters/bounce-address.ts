import type { LinkTokens } from '../adapters/secrets/link-tokens.js';

const SIGNATURE_LENGTH = 16;

const signatureOf = (recipientId: string, tokens: Pick<LinkTokens, 'sign'>): string =>
  // Parts of addresses may lose their capitals on the way.
  Buffer.from(tokens.sign(`bounce:${recipientId}`))
    .toString('hex')
    .slice(0, SIGNATURE_LENGTH);

/** `bounces+<recipient>-<signature>@domain`: a report that comes back says by itself whose mail it is about. */
export const returnPathOf = (
  bounceAddress: string,
  recipientId: string,
  tokens: Pick<LinkTokens, 'sign'>,
): string => {
  const at = bounceAddress.lastIndexOf('@');
  const token = `${recipientId.replaceAll('-', '')}-${signatureOf(recipientId, tokens)}`;
  return `${bounceAddress.slice(0, at)}+${token}${bounceAddress.slice(at)}`;
};

/** The recipient a return path names, or null where it is not one of ours. */
export const recipientOf = (address: string, tokens: Pick<LinkTokens, 'sign'>): string | null => {
  const [, hex, signature] = /\+([0-9a-f]{32})-([0-9a-f]{16})@/i.exec(address) ?? [];
  if (!hex || !signature) return null;
  const id = hex.toLowerCase().replace(/^(.{8})(.{4})(.{4})(.{4})(.{12})$/, '$1-$2-$3-$4-$5');
  return signatureOf(id, tokens) === signature.toLowerCase() ? id : null;
};
