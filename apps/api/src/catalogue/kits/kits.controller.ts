import { Controller, Res } from '@nestjs/common';
import type { Answer, Handled } from '@windchest/contracts';
import type { Response } from 'express';
import { Endpoint, Input } from '../../http/endpoint.js';
import { PartPreviews } from '../files/part-previews.js';
import { PrintSheets } from '../print/print-sheets.js';
import { ShopKits } from './shop-kits.js';

@Controller()
export class KitsController {
  constructor(
    private readonly kits: ShopKits,
    private readonly previews: PartPreviews,
    private readonly printSheets: PrintSheets,
  ) {}

  @Endpoint('GET /kits')
  list(@Input() input: Handled<'GET /kits'>): Promise<Answer<'GET /kits'>> {
    return this.kits.list(input);
  }

  @Endpoint('GET /kits/:slug')
  read(@Input() { params }: Handled<'GET /kits/:slug'>): Promise<Answer<'GET /kits/:slug'>> {
    return this.kits.read(params.slug);
  }

  @Endpoint('GET /kits/:slug/parts')
  parts(@Input() { params }: Handled<'GET /kits/:slug/parts'>): Promise<Answer<'GET /kits/:slug/parts'>> {
    return this.kits.parts(params.slug);
  }

  @Endpoint('GET /kits/:slug/parts/:code/preview')
  async preview(
    @Input() { params, query }: Handled<'GET /kits/:slug/parts/:code/preview'>,
    @Res() response: Response,
  ): Promise<void> {
    const revisionId = await this.kits.newestRevisionId(params.slug);
    await this.previews.send(
      { revisionId, part: { code: params.code }, named: query.v, isPublic: true },
      response,
    );
  }

  @Endpoint('GET /kits/:slug/print')
  async printSheet(
    @Input() { params }: Handled<'GET /kits/:slug/print'>,
  ): Promise<Answer<'GET /kits/:slug/print'>> {
    return this.printSheets.sheetOf(await this.kits.newestRevisionId(params.slug));
  }
}
