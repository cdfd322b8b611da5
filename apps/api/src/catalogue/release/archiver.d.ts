/** The part of archiver 8 that bundles are written with; it ships no types of its own. */
declare module 'archiver' {
  import type { Readable, Transform } from 'node:stream';

  export class ZipArchive extends Transform {
    constructor(options: { store?: boolean });
    append(source: Buffer | Readable, data: { name: string; date: Date; mode: number }): this;
    finalize(): Promise<void>;
    abort(): this;
  }
}
