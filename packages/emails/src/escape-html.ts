const entities: Readonly<Record<string, string>> = {
  '&': '&amp;',
  '<': '&lt;',
  '>': '&gt;',
  '"': '&quot;',
  "'": '&#39;',
};

/** Makes text safe between tags and inside quoted attributes. */
export const escapeHtml = (text: string): string =>
  text.replace(/[&<>"']/g, (sign) => entities[sign] ?? sign);

/**
 * A link as an attribute. Only absolute http and https addresses pass: anything else in a mail is either a
 * mistake or an attack. Throws TypeError that names the address.
 */
export function escapeLink(link: string): string {
  const isWebAddress = /^https?:\/\/[^\s"'<>\\]+$/i.test(link) && URL.canParse(link);
  if (!isWebAddress)
    throw new TypeError(`"${link}" is not a web address. Give an absolute http or https link.`);
  return escapeHtml(link);
}
