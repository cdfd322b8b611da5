import { Controller, Req, Res } from '@nestjs/common';
import type { Answer, Handled, RevisionDetail } from '@windchest/contracts';
import type { Request, Response } from 'express';
import { Endpoint, Input } from '../../http/endpoint.js';
import { ThisPerson, type SignedIn } from '../../http/person.js';
import { Comparison } from '../comparison/comparison.js';
import { OfferFiles } from '../files/offer-files.js';
import { PartPreviews } from '../files/part-previews.js';
import { RemoveFile } from '../files/remove-file.js';
import { UploadFile } from '../files/upload-file.js';
import { WaiveGate } from '../gates/waive-gate.js';
import { RequestRelease } from '../release/request-release.js';
import { WithdrawRevision } from '../release/withdraw-revision.js';
import { ChangeRevision } from './change-revision.js';
import { ChangeVariants } from './change-variants.js';
import { RevisionView } from './revision-view.js';
import { StartRevision } from './start-revision.js';

@Controller()
export class RevisionsController {
  constructor(
    private readonly view: RevisionView,
    private readonly startRevision: StartRevision,
    private readonly changeRevision: ChangeRevision,
    private readonly changeVariants: ChangeVariants,
    private readonly offerFiles: OfferFiles,
    private readonly uploadFile: UploadFile,
    private readonly removeFile: RemoveFile,
    private readonly comparison: Comparison,
    private readonly waiveGate: WaiveGate,
    private readonly requestRelease: RequestRelease,
    private readonly withdrawRevision: WithdrawRevision,
    private readonly previews: PartPreviews,
  ) {}

  @Endpoint('POST /workshop/kits/:kitId/revisions')
  async start(
    @ThisPerson() person: SignedIn,
    @Input() input: Handled<'POST /workshop/kits/:kitId/revisions'>,
  ): Promise<RevisionDetail> {
    return this.view.read(await this.startRevision.start(person, input));
  }

  @Endpoint('GET /workshop/revisions/:revisionId')
  read(@Input() { params }: Handled<'GET /workshop/revisions/:revisionId'>): Promise<RevisionDetail> {
    return this.view.read(params.revisionId);
  }

  @Endpoint('PATCH /workshop/revisions/:revisionId')
  async change(
    @ThisPerson() person: SignedIn,
    @Input() input: Handled<'PATCH /workshop/revisions/:revisionId'>,
  ): Promise<RevisionDetail> {
    await this.changeRevision.change(person, input);
    return this.view.read(input.params.revisionId);
  }

  @Endpoint('DELETE /workshop/revisions/:revisionId')
  throwAway(
    @ThisPerson() person: SignedIn,
    @Input() { params }: Handled<'DELETE /workshop/revisions/:revisionId'>,
  ): Promise<void> {
    return this.changeRevision.throwAway(person, params.revisionId);
  }

  @Endpoint('POST /workshop/revisions/:revisionId/offers')
  offer(
    @ThisPerson() person: SignedIn,
    @Input() input: Handled<'POST /workshop/revisions/:revisionId/offers'>,
  ): Promise<Answer<'POST /workshop/revisions/:revisionId/offers'>> {
    return this.offerFiles.offer(person, input);
  }

  @Endpoint('POST /workshop/revisions/:revisionId/files')
  async upload(
    @ThisPerson() person: SignedIn,
    @Input() { params }: Handled<'POST /workshop/revisions/:revisionId/files'>,
    @Req() request: Request,
    @Res({ passthrough: true }) response: Response,
  ): Promise<Answer<'POST /workshop/revisions/:revisionId/files'>> {
    const fileId = await this.uploadFile.receive(person, params.revisionId, request, response);
    return this.view.file(params.revisionId, fileId);
  }

  @Endpoint('DELETE /workshop/revisions/:revisionId/files/:fileId')
  remove(
    @ThisPerson() person: SignedIn,
    @Input() { params }: Handled<'DELETE /workshop/revisions/:revisionId/files/:fileId'>,
  ): Promise<void> {
    return this.removeFile.remove(person, params.revisionId, params.fileId);
  }

  @Endpoint('PUT /workshop/revisions/:revisionId/parts/:partId')
  async changePart(
    @ThisPerson() person: SignedIn,
    @Input() input: Handled<'PUT /workshop/revisions/:revisionId/parts/:partId'>,
  ): Promise<Answer<'PUT /workshop/revisions/:revisionId/parts/:partId'>> {
    await this.changeRevision.changePart(person, input);
    return this.view.part(input.params.revisionId, input.params.partId);
  }

  @Endpoint('DELETE /workshop/revisions/:revisionId/parts/:partId')
  dropPart(
    @ThisPerson() person: SignedIn,
    @Input() { params }: Handled<'DELETE /workshop/revisions/:revisionId/parts/:partId'>,
  ): Promise<void> {
    return this.changeRevision.dropPart(person, params.revisionId, params.partId);
  }

  @Endpoint('GET /workshop/revisions/:revisionId/parts/:partId/preview')
  preview(
    @Input() { params, query }: Handled<'GET /workshop/revisions/:revisionId/parts/:partId/preview'>,
    @Res() response: Response,
  ): Promise<void> {
    const { revisionId, partId } = params;
    return this.previews.send(
      { revisionId, part: { id: partId }, named: query.v, isPublic: false },
      response,
    );
  }

  @Endpoint('PUT /workshop/revisions/:revisionId/parts/:partId/variants/:clearance')
  async giveVariant(
    @ThisPerson() person: SignedIn,
    @Input() input: Handled<'PUT /workshop/revisions/:revisionId/parts/:partId/variants/:clearance'>,
  ): Promise<Answer<'PUT /workshop/revisions/:revisionId/parts/:partId'>> {
    await this.changeVariants.give(person, input);
    return this.view.part(input.params.revisionId, input.params.partId);
  }

  @Endpoint('DELETE /workshop/revisions/:revisionId/parts/:partId/variants/:clearance')
  async takeVariant(
    @ThisPerson() person: SignedIn,
    @Input() input: Handled<'DELETE /workshop/revisions/:revisionId/parts/:partId/variants/:clearance'>,
  ): Promise<Answer<'PUT /workshop/revisions/:revisionId/parts/:partId'>> {
    await this.changeVariants.take(person, input);
    return this.view.part(input.params.revisionId, input.params.partId);
  }

  @Endpoint('GET /workshop/revisions/:revisionId/comparison')
  compare(
    @Input() { params, query }: Handled<'GET /workshop/revisions/:revisionId/comparison'>,
  ): Promise<Answer<'GET /workshop/revisions/:revisionId/comparison'>> {
    return this.comparison.read(params.revisionId, query.with);
  }

  @Endpoint('PUT /workshop/revisions/:revisionId/marks')
  mark(
    @ThisPerson() person: SignedIn,
    @Input() input: Handled<'PUT /workshop/revisions/:revisionId/marks'>,
  ): Promise<Answer<'PUT /workshop/revisions/:revisionId/marks'>> {
    return this.comparison.mark(person, input);
  }

  @Endpoint('PUT /workshop/revisions/:revisionId/waivers/:gate')
  async waive(
    @ThisPerson() person: SignedIn,
    @Input() input: Handled<'PUT /workshop/revisions/:revisionId/waivers/:gate'>,
  ): Promise<RevisionDetail> {
    await this.waiveGate.waive(person, input);
    return this.view.read(input.params.revisionId);
  }

  @Endpoint('DELETE /workshop/revisions/:revisionId/waivers/:gate')
  async takeWaiverBack(
    @ThisPerson() person: SignedIn,
    @Input() input: Handled<'DELETE /workshop/revisions/:revisionId/waivers/:gate'>,
  ): Promise<RevisionDetail> {
    await this.waiveGate.takeBack(person, input);
    return this.view.read(input.params.revisionId);
  }

  @Endpoint('POST /workshop/revisions/:revisionId/release')
  async release(
    @ThisPerson() person: SignedIn,
    @Input() { params }: Handled<'POST /workshop/revisions/:revisionId/release'>,
  ): Promise<RevisionDetail> {
    await this.requestRelease.request(person, params.revisionId);
    return this.view.read(params.revisionId);
  }

  @Endpoint('POST /workshop/revisions/:revisionId/withdrawal')
  async withdraw(
    @ThisPerson() person: SignedIn,
    @Input() input: Handled<'POST /workshop/revisions/:revisionId/withdrawal'>,
  ): Promise<RevisionDetail> {
    await this.withdrawRevision.withdraw(person, input);
    return this.view.read(input.params.revisionId);
  }
}
