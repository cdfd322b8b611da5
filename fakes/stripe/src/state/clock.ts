/** Real time plus an offset that tests and developers may move. */
export class VirtualClock {
  offsetMs = 0;

  nowMs(): number {
    return Date.now() + this.offsetMs;
  }

  /** Unix time in whole seconds, as every `created` field has it. */
  nowSeconds(): number {
    return Math.floor(this.nowMs() / 1000);
  }
}
