import { Readable } from 'node:stream';
import { Controller, StreamableFile } from '@nestjs/common';
import type { Answer, Handled } from '@windchest/contracts';
import { Endpoint, Input } from '../http/endpoint.js';
import { ThisPerson, type SignedIn } from '../http/person.js';
import { AnswerFit } from './answer-fit.js';
import { FitMatrices } from './fit-matrix.js';
import { ListFitReports } from './list-fit-reports.js';

/** For those who mend. */
@Controller()
export class WorkshopFitController {
  constructor(
    private readonly reports: ListFitReports,
    private readonly matrices: FitMatrices,
    private readonly answerFit: AnswerFit,
  ) {}

  @Endpoint('GET /workshop/fit-reports')
  list(
    @Input() { query }: Handled<'GET /workshop/fit-reports'>,
  ): Promise<Answer<'GET /workshop/fit-reports'>> {
    return this.reports.list(query);
  }

  @Endpoint('GET /workshop/fit-reports.csv')
  csv(@Input() { query }: Handled<'GET /workshop/fit-reports.csv'>): StreamableFile {
    return new StreamableFile(Readable.from(this.reports.csv(query), { objectMode: false }), {
      type: 'text/csv; charset=utf-8',
      disposition: 'attachment; filename="fit-reports.csv"',
    });
  }

  @Endpoint('GET /workshop/fit-reports/:reportId')
  read(
    @Input() { params }: Handled<'GET /workshop/fit-reports/:reportId'>,
  ): Promise<Answer<'GET /workshop/fit-reports/:reportId'>> {
    return this.reports.one(params.reportId);
  }

  @Endpoint('POST /workshop/fit-reports/:reportId/answers')
  answer(
    @ThisPerson() person: SignedIn,
    @Input() { params, body }: Handled<'POST /workshop/fit-reports/:reportId/answers'>,
  ): Promise<Answer<'POST /workshop/fit-reports/:reportId/answers'>> {
    return this.answerFit.answer(person, params.reportId, body.text);
  }

  @Endpoint('POST /workshop/fit-fixes')
  async fix(
    @ThisPerson() person: SignedIn,
    @Input() { body }: Handled<'POST /workshop/fit-fixes'>,
  ): Promise<Answer<'POST /workshop/fit-fixes'>> {
    return { count: await this.answerFit.fix(person, body) };
  }

  @Endpoint('POST /workshop/fit-reports/:reportId/closing')
  close(
    @ThisPerson() person: SignedIn,
    @Input() { params }: Handled<'POST /workshop/fit-reports/:reportId/closing'>,
  ): Promise<Answer<'POST /workshop/fit-reports/:reportId/closing'>> {
    return this.answerFit.close(person, params.reportId);
  }

  @Endpoint('GET /workshop/kits/:kitId/fit-matrix')
  matrix(
    @Input() input: Handled<'GET /workshop/kits/:kitId/fit-matrix'>,
  ): Promise<Answer<'GET /workshop/kits/:kitId/fit-matrix'>> {
    return this.matrices.of(input);
  }
}
