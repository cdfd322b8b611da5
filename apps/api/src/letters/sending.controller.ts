import { Controller } from '@nestjs/common';
import type { Answer, Handled } from '@windchest/contracts';
import { Endpoint, Input } from '../http/endpoint.js';
import { ThisPerson, type SignedIn } from '../http/person.js';
import { SteerLetter } from './steer-letter.js';

/** For those who may let a letter go. */
@Controller()
export class SendingController {
  constructor(private readonly steer: SteerLetter) {}

  @Endpoint('POST /workshop/letters/:letterId/sending')
  send(
    @ThisPerson() person: SignedIn,
    @Input() { params, body }: Handled<'POST /workshop/letters/:letterId/sending'>,
  ): Promise<Answer<'POST /workshop/letters/:letterId/sending'>> {
    return this.steer.send(person, params.letterId, body.sendAt === null ? null : new Date(body.sendAt));
  }

  @Endpoint('POST /workshop/letters/:letterId/pause')
  pause(
    @ThisPerson() person: SignedIn,
    @Input() { params }: Handled<'POST /workshop/letters/:letterId/pause'>,
  ): Promise<Answer<'POST /workshop/letters/:letterId/pause'>> {
    return this.steer.pause(person, params.letterId);
  }

  @Endpoint('POST /workshop/letters/:letterId/resume')
  resume(
    @ThisPerson() person: SignedIn,
    @Input() { params }: Handled<'POST /workshop/letters/:letterId/resume'>,
  ): Promise<Answer<'POST /workshop/letters/:letterId/resume'>> {
    return this.steer.resume(person, params.letterId);
  }

  @Endpoint('POST /workshop/letters/:letterId/cancellation')
  cancel(
    @ThisPerson() person: SignedIn,
    @Input() { params }: Handled<'POST /workshop/letters/:letterId/cancellation'>,
  ): Promise<Answer<'POST /workshop/letters/:letterId/cancellation'>> {
    return this.steer.cancel(person, params.letterId);
  }
}
