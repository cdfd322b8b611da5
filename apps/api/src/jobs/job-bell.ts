import { EventEmitter } from 'node:events';
import { Injectable } from '@nestjs/common';

/** Wakes the workers of this process when a job was committed here; other processes find it by polling. */
@Injectable()
export class JobBell {
  private readonly events = new EventEmitter();

  ring(): void {
    this.events.emit('ring');
  }

  onRing(listener: () => void): () => void {
    this.events.on('ring', listener);
    return () => this.events.off('ring', listener);
  }
}
