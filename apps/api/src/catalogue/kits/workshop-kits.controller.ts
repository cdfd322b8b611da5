import { Controller } from '@nestjs/common';
import type { Answer, Handled } from '@windchest/contracts';
import { Endpoint, Input } from '../../http/endpoint.js';
import { ThisPerson, type SignedIn } from '../../http/person.js';
import { DraftKit } from './draft-kit.js';
import { PriceLicence } from './price-licence.js';
import { WorkshopKits, type WorkshopKitAnswer } from './workshop-kits.js';

@Controller()
export class WorkshopKitsController {
  constructor(
    private readonly kits: WorkshopKits,
    private readonly draftKit: DraftKit,
    private readonly priceLicence: PriceLicence,
  ) {}

  @Endpoint('GET /workshop/kits')
  list(@Input() input: Handled<'GET /workshop/kits'>): Promise<Answer<'GET /workshop/kits'>> {
    return this.kits.list(input);
  }

  @Endpoint('POST /workshop/kits')
  async draft(
    @ThisPerson() person: SignedIn,
    @Input() input: Handled<'POST /workshop/kits'>,
  ): Promise<WorkshopKitAnswer> {
    return this.kits.read(await this.draftKit.draft(person, input));
  }

  @Endpoint('GET /workshop/kits/:kitId')
  read(@Input() { params }: Handled<'GET /workshop/kits/:kitId'>): Promise<WorkshopKitAnswer> {
    return this.kits.read(params.kitId);
  }

  @Endpoint('PATCH /workshop/kits/:kitId')
  async change(
    @ThisPerson() person: SignedIn,
    @Input() input: Handled<'PATCH /workshop/kits/:kitId'>,
  ): Promise<WorkshopKitAnswer> {
    await this.draftKit.change(person, input);
    return this.kits.read(input.params.kitId);
  }

  @Endpoint('POST /workshop/kits/:kitId/licences')
  async offerLicence(
    @ThisPerson() person: SignedIn,
    @Input() input: Handled<'POST /workshop/kits/:kitId/licences'>,
  ): Promise<WorkshopKitAnswer> {
    await this.priceLicence.offer(person, input);
    return this.kits.read(input.params.kitId);
  }

  @Endpoint('PUT /workshop/kits/:kitId/licences/:licenceId')
  async changeLicence(
    @ThisPerson() person: SignedIn,
    @Input() input: Handled<'PUT /workshop/kits/:kitId/licences/:licenceId'>,
  ): Promise<WorkshopKitAnswer> {
    await this.priceLicence.change(person, input);
    return this.kits.read(input.params.kitId);
  }
}
