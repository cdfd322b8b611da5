import { Injectable } from '@nestjs/common';

/** The time, behind an interface so that tests can set it. */
@Injectable()
export class Clock {
  now(): Date {
    return new Date();
  }

  /** @param seconds from now; negative is past. */
  in(seconds: number): Date {
    return new Date(this.now().getTime() + seconds * 1000);
  }
}
