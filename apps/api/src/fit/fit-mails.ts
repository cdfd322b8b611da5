import { Injectable } from '@nestjs/common';
import { CatalogueReader } from '../catalogue/catalogue-reader.js';
import { InjectConfig, type Config } from '../config/config.js';
import type { Tx } from '../database/transactions.js';
import { MailOutbox } from '../mails/mail-outbox.js';
import type { FitReport } from './fit-report.model.js';

interface Reporter {
  readonly email: string;
  readonly name: string;
}

/** What a reporter hears: the workshop's answer, and that the part was mended. Each once. */
@Injectable()
export class FitMails {
  constructor(
    @InjectConfig() private readonly config: Config,
    private readonly catalogue: CatalogueReader,
    private readonly mails: MailOutbox,
  ) {}

  async answered(
    tx: Tx,
    { email, name }: Reporter,
    report: FitReport,
    answer: { readonly id: string; readonly by: string; readonly text: string },
  ): Promise<void> {
    const facts = await this.factsOf(report);
    await this.mails.add(tx, {
      to: email,
      message: { template: 'fit-answered', name, ...facts, by: answer.by, text: answer.text },
      key: `fit-answer:${answer.id}`,
    });
  }

  async fixed(tx: Tx, { email, name }: Reporter, report: FitReport): Promise<void> {
    const { link, ...facts } = await this.factsOf(report);
    const choices = await this.catalogue.revisionChoices(report.kitId);
    const fix = choices.find(({ id }) => id === report.fixedInId);
    if (!fix) return;
    await this.mails.add(tx, {
      to: email,
      message: {
        template: 'fit-fixed',
        name,
        ...facts,
        fixedIn: fix.label,
        link: link.replace(/\/fit$/, ''),
      },
      key: `fit-fixed:${report.id}:${fix.id}`,
    });
  }

  private async factsOf(
    report: FitReport,
  ): Promise<{ kit: string; revision: string; part: string; link: string }> {
    const [kit] = await this.catalogue.kitsByIds([report.kitId]);
    const revision = await this.catalogue.revisionById(report.revisionId);
    return {
      kit: kit?.name ?? '',
      revision: revision?.label ?? '',
      part: `${report.partCode} ${report.partName}`,
      link: new URL(`/shelf/${kit?.slug ?? ''}/fit`, this.config.BASE_URL).href,
    };
  }
}
