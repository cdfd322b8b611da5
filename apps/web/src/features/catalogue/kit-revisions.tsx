import type { OutputOf, WorkshopKit } from '@windchest/contracts';
import { paths } from '../../config/paths.js';
import { kitTexts as texts } from '../../config/texts/workshop-kits.js';
import { bytes, date } from '../../lib/format.js';
import { useSession } from '../../lib/session.js';
import { EmptyState } from '../../ui/empty-state.js';
import { TextLink } from '../../ui/link.js';
import type { SignName } from '../../ui/sign.js';
import { StatusMark } from '../../ui/status-mark.js';
import { type Column, HairlineTable } from '../../ui/table/hairline-table.js';
import { Heading } from '../../ui/text.js';
import { StartRevision } from './start-revision.js';

type Summary = OutputOf<'GET /workshop/kits/:kitId'>['revisions'][number];

const signs: Record<Summary['state'], SignName> = {
  draft: 'wait',
  proving: 'wait',
  released: 'ok',
  withdrawn: 'stop',
};

const columnsOf = (kitId: string): Column<Summary>[] => [
  {
    key: 'label',
    header: texts.revisionColumns.label,
    isHeading: true,
    cell: (one) => (
      <TextLink to={paths.workshop.revision.to({ kitId, revisionId: one.id })} fontWeight="semibold">
        {one.label}
      </TextLink>
    ),
  },
  {
    key: 'state',
    header: texts.revisionColumns.state,
    cell: (one) => (
      <StatusMark state={signs[one.state]} fontWeight="normal">
        {texts.states[one.state]}
      </StatusMark>
    ),
  },
  { key: 'parts', header: texts.revisionColumns.parts, isNumeric: true, cell: (one) => one.partCount },
  {
    key: 'bundle',
    header: texts.revisionColumns.bundle,
    isNumeric: true,
    cell: (one) => (one.bundleBytes === null ? texts.none : bytes(one.bundleBytes)),
  },
  { key: 'date', header: texts.revisionColumns.date, cell: (one) => date(one.releasedAt ?? one.createdAt) },
];

/** All revisions of a kit, newest first, and the start of the next. */
export function KitRevisions({ kit }: { kit: WorkshopKit }) {
  const { may } = useSession();
  const start = may('revisions:write') && <StartRevision kit={kit} />;
  if (kit.revisions.length === 0)
    return (
      <EmptyState title={texts.noRevision} action={start}>
        {texts.noRevisionDetail}
      </EmptyState>
    );
  return (
    <>
      <Heading level={2} look="section" marginBottom="1">
        {texts.revisions}
      </Heading>
      <HairlineTable
        caption={texts.revisionsCaption}
        columns={columnsOf(kit.id)}
        rows={kit.revisions}
        rowKey={(one) => one.id}
      />
      {start}
    </>
  );
}
