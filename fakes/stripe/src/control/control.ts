import type { Fields } from '../api/fields.js';

/** One switch: what it is given, and the `:id` of its path. */
export type Control = (fields: Fields, id: string) => object | Promise<object>;
