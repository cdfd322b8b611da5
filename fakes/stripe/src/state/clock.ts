/** Real time plus an offset that tests and developers may move. */
export class VirtualClock {
  offsetMs = 0;
  private heldMs: number | null = null;

  /** The moment in which things happen: the flowing one, or the one that is held. */
  nowMs(): number {
    return this.heldMs ?? this.flowingMs();
  }

  /** Unix time in whole seconds, as every `created` field has it. */
  nowSeconds(): number {
    return Math.floor(this.nowMs() / 1000);
  }

  /** Time that goes on by itself, for what is sent and kept rather than for what happens. */
  flowingMs(): number {
    return Date.now() + this.offsetMs;
  }

  /** Works as at `ms`: what fell due on the way to now, or what lives by a test clock. */
  at<T>(ms: number, work: () => T): T {
    const before = this.heldMs;
    this.heldMs = ms;
    try {
      return work();
    } finally {
      this.heldMs = before;
    }
  }
}
