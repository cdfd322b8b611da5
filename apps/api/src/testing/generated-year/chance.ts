/** Numbers that look like chance and are the same in every run of the same seed (mulberry32). */
export class Chance {
  constructor(private state: number) {}

  /** From 0 up to, but not including, 1. */
  next(): number {
    this.state = (this.state + 0x6d2b79f5) | 0;
    let mixed = Math.imul(this.state ^ (this.state >>> 15), 1 | this.state);
    mixed = (mixed + Math.imul(mixed ^ (mixed >>> 7), 61 | mixed)) ^ mixed;
    return ((mixed ^ (mixed >>> 14)) >>> 0) / 2 ** 32;
  }

  /** A whole number from `least` to `most`, both included. */
  between(least: number, most: number): number {
    return least + Math.floor(this.next() * (most - least + 1));
  }

  isHit(probability: number): boolean {
    return this.next() < probability;
  }

  oneOf<T>(things: readonly [T, ...T[]]): T {
    return things[this.between(0, things.length - 1)] ?? things[0];
  }

  /** One of things with weights. */
  weighted<T>(things: readonly (readonly [thing: T, weight: number])[]): T {
    const whole = things.reduce((sum, [, weight]) => sum + weight, 0);
    let at = this.next() * whole;
    for (const [thing, weight] of things) {
      at -= weight;
      if (at < 0) return thing;
    }
    const last = things.at(-1);
    if (!last) throw new Error('There is nothing to choose from.');
    return last[0];
  }
}
