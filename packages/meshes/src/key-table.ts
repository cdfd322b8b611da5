/**
 * Numbers whole keys (up to 2⁵³) in the order of their first coming, in typed arrays: a `Map` of millions of
 * entries costs many times the time and memory.
 */
export class KeyTable {
  size = 0;
  private keys: Float64Array;
  private names: Int32Array;

  constructor(expected: number) {
    const slots = 2 ** Math.ceil(Math.log2(Math.max(16, 2 * expected)));
    this.keys = new Float64Array(slots);
    this.names = new Int32Array(slots).fill(-1);
  }

  /** The number of a key; a new key gets the next number. */
  nameOf(key: number): number {
    const slot = this.slotOf(key);
    const known = this.names[slot]!;
    if (known >= 0) return known;
    const name = this.size;
    this.keys[slot] = key;
    this.names[slot] = name;
    this.size += 1;
    if (this.size * 2 > this.names.length) this.grow();
    return name;
  }

  private slotOf(key: number): number {
    const mask = this.names.length - 1;
    let hash = Math.imul((key % 2 ** 32) | 0, 0x9e3779b1) ^ Math.imul((key / 2 ** 32) | 0, 0x85ebca6b);
    hash = Math.imul(hash ^ (hash >>> 15), 0x2c1b3c6d);
    let slot = (hash ^ (hash >>> 13)) & mask;
    while (this.names[slot]! >= 0 && this.keys[slot] !== key) slot = (slot + 1) & mask;
    return slot;
  }

  private grow(): void {
    const { keys, names } = this;
    this.keys = new Float64Array(2 * keys.length);
    this.names = new Int32Array(2 * names.length).fill(-1);
    for (let i = 0; i < names.length; i += 1) {
      if (names[i]! < 0) continue;
      const slot = this.slotOf(keys[i]!);
      this.keys[slot] = keys[i]!;
      this.names[slot] = names[i]!;
    }
  }
}
