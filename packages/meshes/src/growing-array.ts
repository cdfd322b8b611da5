/** A list of doubles that grows by doubling, without boxing its numbers. */
export class GrowingDoubles {
  private store = new Float64Array(1536);
  length = 0;

  push(value: number): void {
    if (this.length === this.store.length) {
      const larger = new Float64Array(2 * this.store.length);
      larger.set(this.store);
      this.store = larger;
    }
    this.store[this.length] = value;
    this.length += 1;
  }

  get values(): Float64Array {
    return this.store.subarray(0, this.length);
  }
}
