import type { Supporter } from '@windchest/contracts';
import { workshopOrderTexts } from '../../config/texts/workshop-orders.js';
import { supporterTexts as texts } from '../../config/texts/workshop-supporters.js';
import { dateTime } from '../../lib/format.js';
import { type Column, HairlineTable } from '../../ui/table/hairline-table.js';

type Mail = Supporter['mails'][number];

const { mailColumns, mailStates } = workshopOrderTexts;
const columns: Column<Mail>[] = [
  { key: 'subject', header: mailColumns.subject, isHeading: true, cell: (mail) => mail.subject },
  { key: 'state', header: mailColumns.state, cell: (mail) => mailStates[mail.state] ?? mail.state },
  {
    key: 'sent',
    header: mailColumns.sent,
    cell: (mail) => (mail.sentAt ? dateTime(mail.sentAt) : texts.none),
  },
];

/** What was mailed about a pledge. */
export const MailsTable = ({ mails }: { mails: readonly Mail[] }) => (
  <HairlineTable caption={texts.mailsCaption} columns={columns} rows={mails} rowKey={(mail) => mail.id} />
);
