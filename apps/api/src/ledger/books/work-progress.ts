import type { Sequelize } from 'sequelize';
import { touchRows } from '../../database/rows.js';

/** Shows how far a piece of work is, a whole percent at a time and one write at a time. */
export class WorkProgress {
  private shown = 0;
  private wanted = 0;
  private writing: Promise<void> | null = null;

  constructor(
    private readonly database: Sequelize,
    private readonly table: 'ledger_exports' | 'reconciliations',
    private readonly id: string,
  ) {}

  show(percent: number): void {
    this.wanted = Math.max(this.wanted, Math.min(99, Math.floor(percent)));
    if (this.wanted > this.shown && !this.writing)
      this.writing = this.write().finally(() => {
        this.writing = null;
      });
  }

  /** Waits for the last write, so that none comes after the end itself. */
  async settle(): Promise<void> {
    while (this.writing) await this.writing;
  }

  private async write(): Promise<void> {
    while (this.wanted > this.shown) {
      this.shown = this.wanted;
      await touchRows(
        this.database,
        `UPDATE ${this.table} SET percent = :percent WHERE id = :id AND state = 'running'`,
        { percent: this.shown, id: this.id },
        // A percent that is not shown does no harm.
      ).catch(() => 0);
    }
  }
}
