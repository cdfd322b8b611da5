import { Injectable } from '@nestjs/common';
import { InjectModel } from '@nestjs/sequelize';
import { may } from '@windchest/contracts';
import type { Response } from 'express';
import type { SignedIn } from '../http/person.js';
import { notFound } from '../http/refusal.js';
import { Pictures } from '../pictures/pictures.js';
import { FitReport } from './fit-report.model.js';

/** The picture of a report: its reporter's and the workshop's, nobody else's. */
@Injectable()
export class FitPicture {
  constructor(
    @InjectModel(FitReport) private readonly reports: typeof FitReport,
    private readonly pictures: Pictures,
  ) {}

  async send(person: SignedIn, reportId: string, response: Response): Promise<void> {
    const report = await this.reports.findByPk(reportId);
    const { pictureSha256: sha256, pictureType: contentType, pictureBytes: bytes } = report ?? {};
    const isTheirs = report?.personId === person.id || may(person.role, 'fit:read');
    if (!isTheirs || !sha256 || !contentType || !bytes) throw notFound('picture');
    await this.pictures.send(response, { sha256, contentType, bytes }, false);
  }
}
