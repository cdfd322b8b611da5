import { Injectable } from '@nestjs/common';
import { InjectConnection, InjectModel } from '@nestjs/sequelize';
import type { Answer, Handled } from '@windchest/contracts';
import type { Sequelize } from 'sequelize';
import { InjectConfig, type Config } from '../config/config.js';
import { selectRows } from '../database/rows.js';
import type { SignedIn } from '../http/person.js';
import { notFound } from '../http/refusal.js';
import { greetedName } from '@windchest/emails';
import { fillFields } from './letter-fields.js';
import { LetterDesk } from './letter-desk.js';
import { LetterMatters } from './letter-matter.js';
import { Letter } from './letter.model.js';
import { filledMarkdown } from './plain-letter.js';

interface OwnRow {
  id: string;
  letterId: string;
  sentAt: Date;
  name: string;
  personId: string | null;
  heldId: string | null;
  subject: string;
  kind: 'service' | 'news';
  total: number;
}
const OWN = `FROM letter_recipients r JOIN letters l ON l.id = r.letter_id
  WHERE (r.person_id = :personId OR (:email IS NOT NULL AND r.email = :email)) AND r.state IN ('sent', 'handed-over', 'bounced')`;
const OWN_COLUMNS = `r.id, r.letter_id AS letterId, COALESCE(r.sent_at, l.started_at) AS sentAt, r.name, r.person_id AS personId,
  r.held_revision_id AS heldId, l.subject, l.kind`;

/** Letters to read again: news for everybody, and to each person what was written to them. */
@Injectable()
export class ReadLetters {
  constructor(
    @InjectConnection() private readonly database: Sequelize,
    @InjectModel(Letter) private readonly letters: typeof Letter,
    @InjectConfig() private readonly config: Config,
    private readonly matters: LetterMatters,
    private readonly desk: LetterDesk,
  ) {}

  async archive({ query }: Handled<'GET /letters'>): Promise<Answer<'GET /letters'>> {
    const { rows, count } = await this.letters.findAndCountAll({
      where: { kind: 'news', state: 'sent' },
      order: [
        ['startedAt', 'DESC'],
        ['id', 'DESC'],
      ],
      limit: query.size,
      offset: (query.page - 1) * query.size,
    });
    const items = await Promise.all(
      rows.map(async (letter) => ({
        slug: letter.slug ?? '',
        subject: fillFields(letter.subject, await this.publicValue(letter)),
        sentAt: (letter.startedAt ?? letter.updatedAt).toISOString(),
      })),
    );
    return { items, page: query.page, size: query.size, total: count };
  }

  async archived(slug: string): Promise<Answer<'GET /letters/:slug'>> {
    const letter = await this.letters.findOne({ where: { slug, kind: 'news', state: 'sent' } });
    if (!letter) throw notFound('letter');
    const valueOf = await this.publicValue(letter);
    return {
      slug,
      subject: fillFields(letter.subject, valueOf),
      sentAt: (letter.startedAt ?? letter.updatedAt).toISOString(),
      body: filledMarkdown(
        letter.body,
        {
          name: '',
          kit: valueOf('kit'),
          held: valueOf('held'),
          newest: valueOf('newest'),
          download_link: valueOf('download_link'),
        },
        null,
      ),
    };
  }

  async own(
    person: SignedIn,
    { query }: Handled<'GET /account/letters'>,
  ): Promise<Answer<'GET /account/letters'>> {
    const rows = await selectRows<OwnRow>(
      this.database,
      `SELECT ${OWN_COLUMNS}, COUNT(*) OVER () AS total ${OWN} ORDER BY sentAt DESC, r.id DESC LIMIT :limit OFFSET :offset`,
      { ...reader(person), limit: query.size, offset: (query.page - 1) * query.size },
    );
    return {
      items: await Promise.all(rows.map(async (row) => (await this.filled(row)).shown)),
      page: query.page,
      size: query.size,
      total: Number(rows[0]?.total ?? 0),
    };
  }

  async ownOne(person: SignedIn, recipientId: string): Promise<Answer<'GET /account/letters/:recipientId'>> {
    const [row] = await selectRows<OwnRow>(
      this.database,
      `SELECT ${OWN_COLUMNS} ${OWN} AND r.id = :recipientId`,
      { ...reader(person), recipientId },
    );
    if (!row) throw notFound('letter to you');
    const { shown, body } = await this.filled(row);
    return { ...shown, body };
  }

  private async filled(
    row: OwnRow,
  ): Promise<{ shown: Answer<'GET /account/letters'>['items'][number]; body: string }> {
    const letter = await this.letters.findByPk(row.letterId);
    if (!letter) throw notFound('letter');
    const { matter, factsOf } = await this.desk.open(letter);
    const facts = await factsOf(row);
    const values = {
      name: greetedName(facts.name) ?? '',
      kit: matter.kit?.name ?? '',
      held: facts.held ?? 'no revision yet',
      newest: matter.target?.label ?? '',
      download_link: facts.downloadLink,
    };
    const list = facts.toPrint.map(({ code }) => code).join(', ');
    return {
      shown: {
        id: row.id,
        subject: fillFields(letter.subject, (field) => (field === 'reprint_list' ? list : values[field])),
        kind: row.kind,
        sentAt: row.sentAt.toISOString(),
      },
      body: filledMarkdown(letter.body, values, facts.toPrint),
    };
  }

  private async publicValue(letter: Letter): Promise<(field: string) => string> {
    const { kit, target } = await this.matters.of(letter);
    const values: Record<string, string> = {
      kit: kit?.name ?? '',
      newest: target?.label ?? '',
      held: 'the revision you hold',
      download_link: kit ? new URL(`/kits/${kit.slug}`, this.config.BASE_URL).href : this.config.BASE_URL,
    };
    return (field) => values[field] ?? '';
  }
}

/** Letters to an address are its owner's once the address is verified. */
const reader = (person: SignedIn): { personId: string; email: string | null } => ({
  personId: person.id,
  email: person.isVerified ? person.email : null,
});
