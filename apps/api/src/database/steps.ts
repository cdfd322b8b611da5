import type { Tx } from './transactions.js';

interface Step<Fact> {
  readonly name: string;
  readonly order: number;
  readonly run: (tx: Tx, fact: Fact) => Promise<void>;
}

/**
 * What higher rooms do inside a lower room's transaction. The lower room owns the moment and knows
 * none of them; they register at start-up and run in their order.
 */
export class Steps<Fact> {
  private steps: Step<Fact>[] = [];

  register(step: Step<Fact>): void {
    this.steps = [...this.steps.filter((one) => one.name !== step.name), step].sort(
      (a, b) => a.order - b.order,
    );
  }

  async run(tx: Tx, fact: Fact): Promise<void> {
    for (const step of this.steps) await step.run(tx, fact);
  }
}
