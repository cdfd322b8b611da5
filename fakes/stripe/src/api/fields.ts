import { badParameter } from './errors.js';

/**
 * Reads the parameters of a call. They come as text in bracketed forms, so that every reader here checks
 * and converts, and names the field as the API does (`line_items[0][quantity]`).
 */
export class Fields {
  constructor(
    private readonly values: Record<string, unknown>,
    private readonly prefix = '',
  ) {}

  nameOf(key: string): string {
    return this.prefix ? `${this.prefix}[${key}]` : key;
  }

  has(key: string): boolean {
    return this.values[key] !== undefined && this.values[key] !== '';
  }

  /** Given, but as nothing: the API's way to clear a field. */
  isEmptied(key: string): boolean {
    return this.values[key] === '';
  }

  isNested(key: string): boolean {
    return typeof this.values[key] === 'object';
  }

  /** Refuses what is not listed: a parameter that is silently dropped would hide a fault. */
  allowOnly(...keys: string[]): void {
    const stranger = Object.keys(this.values).find((key) => !keys.includes(key));
    if (stranger === undefined) return;
    const name = this.nameOf(stranger);
    throw badParameter(
      name,
      `Received unknown parameter: ${name}. The local stand-in offers: ${keys.join(', ')}.`,
      'parameter_unknown',
    );
  }

  string(key: string): string | null {
    const value = this.values[key];
    if (value === undefined || value === '') return null;
    if (typeof value !== 'string')
      throw badParameter(this.nameOf(key), `Invalid string: ${this.nameOf(key)}`);
    return value;
  }

  requiredString(key: string): string {
    const value = this.string(key);
    if (value === null) throw this.missing(key);
    return value;
  }

  integer(key: string): number | null {
    const value = this.string(key);
    if (value === null) return null;
    if (!/^-?\d{1,15}$/.test(value)) {
      throw badParameter(this.nameOf(key), `Invalid integer: ${value}`, 'parameter_invalid_integer');
    }
    return Number(value);
  }

  requiredInteger(key: string): number {
    const value = this.integer(key);
    if (value === null) throw this.missing(key);
    return value;
  }

  boolean(key: string): boolean | null {
    const value = this.oneOf(key, ['true', 'false']);
    return value === null ? null : value === 'true';
  }

  oneOf<const T extends string>(key: string, allowed: readonly T[]): T | null {
    const value = this.string(key);
    if (value === null) return null;
    const match = allowed.find((candidate) => candidate === value);
    if (match === undefined) {
      throw badParameter(
        this.nameOf(key),
        `Invalid ${this.nameOf(key)}: must be one of ${allowed.join(', ')}`,
      );
    }
    return match;
  }

  requiredOneOf<const T extends string>(key: string, allowed: readonly T[]): T {
    const value = this.oneOf(key, allowed);
    if (value === null) throw this.missing(key);
    return value;
  }

  /** Currency codes are lower case in the API, whatever came in. */
  currency(key: string): string | null {
    const value = this.string(key)?.toLowerCase() ?? null;
    if (value !== null && !/^[a-z]{3}$/.test(value)) {
      throw badParameter(this.nameOf(key), `Invalid currency: ${value}.`);
    }
    return value;
  }

  object(key: string): Fields | null {
    const value = this.values[key];
    if (value === undefined || value === '') return null;
    if (typeof value !== 'object' || value === null || Array.isArray(value)) {
      throw badParameter(this.nameOf(key), `Invalid object: ${this.nameOf(key)}`);
    }
    return new Fields(value as Record<string, unknown>, this.nameOf(key));
  }

  objects(key: string): Fields[] {
    const value = this.values[key];
    if (value === undefined || value === '') return [];
    if (!Array.isArray(value)) throw badParameter(this.nameOf(key), `Invalid array: ${this.nameOf(key)}`);
    return value.map((_entry, index) => {
      const entry = new Fields(value as unknown as Record<string, unknown>, this.nameOf(key)).object(
        String(index),
      );
      if (entry === null) throw badParameter(`${this.nameOf(key)}[${index}]`, 'Invalid object: it is empty');
      return entry;
    });
  }

  strings(key: string): string[] {
    const value = this.values[key];
    if (value === undefined || value === '') return [];
    const entries = Array.isArray(value) ? value : [value];
    if (!entries.every((entry) => typeof entry === 'string')) {
      throw badParameter(this.nameOf(key), `Invalid array of strings: ${this.nameOf(key)}`);
    }
    return entries as string[];
  }

  /** Up to 50 keys of 40 characters, values of 500, as the real service has it. An empty value drops its key. */
  metadata(key = 'metadata', before: Record<string, string> = {}): Record<string, string> {
    const given = this.object(key);
    const kept = { ...before };
    for (const name of Object.keys(given?.values ?? {})) {
      const value = given?.string(name) ?? null;
      if (name.length > 40)
        throw badParameter(this.nameOf(key), `Metadata keys have at most 40 characters: ${name}`);
      if ((value?.length ?? 0) > 500) {
        throw badParameter(`${this.nameOf(key)}[${name}]`, 'Metadata values have at most 500 characters.');
      }
      if (value === null) delete kept[name];
      else kept[name] = value;
    }
    if (Object.keys(kept).length > 50) throw badParameter(this.nameOf(key), 'Metadata has at most 50 keys.');
    return kept;
  }

  missing(key: string): Error {
    return badParameter(
      this.nameOf(key),
      `Missing required param: ${this.nameOf(key)}.`,
      'parameter_missing',
    );
  }
}
