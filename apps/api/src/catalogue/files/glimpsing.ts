import type { Glimpse } from './identify-contents.js';

const HEAD_BYTES = 4096;
const TAIL_BYTES = 256 * 1024;
/** Control characters that no text file holds; tab, line ends, form feed and escape are left out. */
// eslint-disable-next-line no-control-regex
const NOT_TEXT = /[\u0000-\u0008\u000b\u000e-\u001a\u001c-\u001f]/;

/** Looks at a file as it goes by, and remembers only its head, its tail, its size and whether it is text. */
export class Glimpsing {
  private bytes = 0;
  private head = Buffer.alloc(0);
  private tail: Buffer[] = [];
  private tailBytes = 0;
  private decoder: InstanceType<typeof TextDecoder> | null = new TextDecoder('utf-8', { fatal: true });

  /** @returns the bytes seen so far */
  see(chunk: Buffer): number {
    this.bytes += chunk.length;
    if (this.head.length < HEAD_BYTES)
      this.head = Buffer.concat([this.head, chunk.subarray(0, HEAD_BYTES - this.head.length)]);
    this.keepTail(chunk);
    this.readText(chunk);
    return this.bytes;
  }

  whole(): Glimpse {
    this.readText(null);
    const tail = Buffer.concat(this.tail);
    return {
      bytes: this.bytes,
      head: this.head,
      tail: tail.subarray(Math.max(0, tail.length - TAIL_BYTES)),
      isText: this.decoder !== null,
    };
  }

  private keepTail(chunk: Buffer): void {
    this.tail.push(chunk);
    this.tailBytes += chunk.length;
    while (this.tail.length > 1 && this.tailBytes - this.tail[0]!.length >= TAIL_BYTES)
      this.tailBytes -= this.tail.shift()!.length;
  }

  private readText(chunk: Buffer | null): void {
    if (!this.decoder) return;
    try {
      const text = chunk ? this.decoder.decode(chunk, { stream: true }) : this.decoder.decode();
      if (NOT_TEXT.test(text)) this.decoder = null;
    } catch {
      this.decoder = null;
    }
  }
}
