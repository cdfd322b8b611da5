import { z } from 'zod';

export const id = z.uuid();
export const idParams = <const K extends string>(...names: K[]) =>
  z.object(Object.fromEntries(names.map((name) => [name, id])) as Record<K, typeof id>);

export const slug = z
  .string()
  .min(2)
  .max(60)
  .regex(/^[a-z0-9]+(-[a-z0-9]+)*$/, 'Use small letters, digits and hyphens.');
export const slugParams = z.object({ slug });

export const email = z
  .string()
  .trim()
  .toLowerCase()
  .max(254)
  .pipe(z.email('That does not look like an e-mail address.'));

/** SHA-256 as 64 small hex digits. */
export const sha256 = z.string().regex(/^[0-9a-f]{64}$/);
/** ISO 8601 in UTC. */
export const moment = z.iso.datetime();
/** A day without a time, `2026-12-31`. */
export const day = z.iso.date('Choose a day.');
/** ISO 3166-1 alpha-2. */
export const countryCode = z.string().regex(/^[A-Z]{2}$/, 'Choose a country.');
export const currencyCode = z.string().regex(/^[A-Z]{3}$/);
export const money = z.object({ minor: z.int(), currency: currencyCode });
export const minor = z.int().min(0).max(100_000_000);
export const line = z.string().trim().min(1).max(200);
export const prose = z.string().max(200_000);
/** A secret of 256 random bits, base64url. */
export const secret = z.string().regex(/^[A-Za-z0-9_-]{43}$/);

/** Filament colours a maker may choose for a kit; the web computes its shades from the key. */
export const filamentColours = ['orange', 'teal', 'violet', 'ochre', 'blue', 'rose', 'moss'] as const;
export const filamentColour = z.enum(filamentColours);
export type FilamentColour = z.output<typeof filamentColour>;

/** Every list is paged on the server: `page` counts from 1. */
export const pageQuery = z.object({
  page: z.coerce.number().int().min(1).max(10_000).default(1),
  size: z.coerce.number().int().min(1).max(100).default(25),
  search: z.string().trim().max(100).optional(),
});
export const pageOf = <T extends z.ZodType>(item: T) =>
  z.object({ items: z.array(item), page: z.int(), size: z.int(), total: z.int() });
export interface Page<T> {
  items: T[];
  page: number;
  size: number;
  total: number;
}
export const sortBy = <const T extends readonly [string, ...string[]]>(keys: T, first: T[number]) =>
  z.object({
    sort: z.enum(keys).default(first as never),
    order: z.enum(['asc', 'desc']).default('desc'),
  });
