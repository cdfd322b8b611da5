/** `Curlew, small` → `curlew-small`: what an address may hold of a name. */
export const slugOf = (name: string): string =>
  name
    .normalize('NFKD')
    .replace(/\p{Mark}/gu, '')
    .toLowerCase()
    .replace(/[^a-z0-9]+/g, '-')
    .replace(/^-+|-+$/g, '')
    .slice(0, 60);
