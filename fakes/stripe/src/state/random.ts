/** A small seedable generator (mulberry32) whose whole state is one number, so that it can be kept. */
export class Random {
  constructor(public state: number) {
    this.state = state >>> 0;
  }

  /** A number from 0 up to, but not including, 1. */
  next(): number {
    this.state = (this.state + 0x6d2b79f5) >>> 0;
    let mixed = this.state;
    mixed = Math.imul(mixed ^ (mixed >>> 15), mixed | 1);
    mixed ^= mixed + Math.imul(mixed ^ (mixed >>> 7), mixed | 61);
    return ((mixed ^ (mixed >>> 14)) >>> 0) / 2 ** 32;
  }

  /** A copy in random order (Fisher–Yates). */
  shuffled<T>(items: readonly T[]): T[] {
    const mixed = [...items];
    for (let last = mixed.length - 1; last > 0; last -= 1) {
      const other = Math.floor(this.next() * (last + 1));
      [mixed[last], mixed[other]] = [mixed[other] as T, mixed[last] as T];
    }
    return mixed;
  }

  /** `length` characters of 0-9, a-z and A-Z. */
  word(length: number): string {
    const alphabet = '0123456789abcdefghijklmnopqrstuvwxyzABCDEFGHIJKLMNOPQRSTUVWXYZ';
    return Array.from({ length }, () => alphabet[Math.floor(this.next() * alphabet.length)]).join('');
  }
}
