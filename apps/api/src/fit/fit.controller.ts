import { Controller, Req, Res } from '@nestjs/common';
import type { Answer, Handled } from '@windchest/contracts';
import type { Request, Response } from 'express';
import { Endpoint, Input } from '../http/endpoint.js';
import { ThisPerson, type SignedIn } from '../http/person.js';
import { FitPicture } from './fit-picture.js';
import { ReportFit } from './report-fit.js';

/** For those who print. */
@Controller()
export class FitController {
  constructor(
    private readonly reportFit: ReportFit,
    private readonly picture: FitPicture,
  ) {}

  @Endpoint('GET /shelf/:slug/fit-reports')
  list(
    @ThisPerson() person: SignedIn,
    @Input() input: Handled<'GET /shelf/:slug/fit-reports'>,
  ): Promise<Answer<'GET /shelf/:slug/fit-reports'>> {
    return this.reportFit.list(person, input);
  }

  @Endpoint('POST /shelf/:slug/fit-reports')
  report(
    @ThisPerson() person: SignedIn,
    @Input() { params, body }: Handled<'POST /shelf/:slug/fit-reports'>,
  ): Promise<Answer<'POST /shelf/:slug/fit-reports'>> {
    return this.reportFit.report(person, params.slug, body);
  }

  @Endpoint('POST /fit-reports/:reportId/picture')
  addPicture(
    @ThisPerson() person: SignedIn,
    @Input() { params }: Handled<'POST /fit-reports/:reportId/picture'>,
    @Req() request: Request,
    @Res({ passthrough: true }) response: Response,
  ): Promise<Answer<'POST /fit-reports/:reportId/picture'>> {
    return this.reportFit.addPicture(person, params.reportId, request, response);
  }

  @Endpoint('GET /fit-reports/:reportId/picture')
  showPicture(
    @ThisPerson() person: SignedIn,
    @Input() { params }: Handled<'GET /fit-reports/:reportId/picture'>,
    @Res() response: Response,
  ): Promise<void> {
    return this.picture.send(person, params.reportId, response);
  }
}
