import { Controller } from '@nestjs/common';
import type { Answer, Handled } from '@windchest/contracts';
import { Endpoint, Input } from '../../http/endpoint.js';
import { ThisPerson, type SignedIn } from '../../http/person.js';
import { ChangePrinterCards } from './change-printer-cards.js';
import { PrinterCards } from './printer-cards.js';

@Controller()
export class PrintersController {
  constructor(
    private readonly cards: PrinterCards,
    private readonly changing: ChangePrinterCards,
  ) {}

  @Endpoint('GET /account/printers')
  list(@ThisPerson() person: SignedIn): Promise<Answer<'GET /account/printers'>> {
    return this.cards.listOf(person.id);
  }

  @Endpoint('POST /account/printers')
  add(
    @ThisPerson() person: SignedIn,
    @Input() { body }: Handled<'POST /account/printers'>,
  ): Promise<Answer<'POST /account/printers'>> {
    return this.changing.add(person.id, body);
  }

  @Endpoint('PUT /account/printers/:printerId')
  change(
    @ThisPerson() person: SignedIn,
    @Input() { params, body }: Handled<'PUT /account/printers/:printerId'>,
  ): Promise<Answer<'PUT /account/printers/:printerId'>> {
    return this.changing.change(person.id, params.printerId, body);
  }

  @Endpoint('DELETE /account/printers/:printerId')
  remove(
    @ThisPerson() person: SignedIn,
    @Input() { params }: Handled<'DELETE /account/printers/:printerId'>,
  ): Promise<void> {
    return this.changing.remove(person.id, params.printerId);
  }
}
