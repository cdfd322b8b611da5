import type { ShelfKit } from '@windchest/contracts';
import { shelfKitTexts } from '../../config/texts/shelf.js';
import { dateTime } from '../../lib/format.js';
import { StatusMark } from '../../ui/status-mark.js';
import { type Column, HairlineTable } from '../../ui/table/hairline-table.js';
import { Text } from '../../ui/text.js';
import { Unbroken } from '../../ui/unbroken.js';

type DownloadRow = ShelfKit['downloads'][number];

const columns: readonly Column<DownloadRow>[] = [
  { key: 'file', header: shelfKitTexts.file, isHeading: true, cell: (row) => row.fileName },
  { key: 'revision', header: shelfKitTexts.revision, cell: (row) => <Unbroken>{row.revision}</Unbroken> },
  { key: 'when', header: shelfKitTexts.when, cell: (row) => <Unbroken>{dateTime(row.at)}</Unbroken> },
  {
    key: 'complete',
    header: shelfKitTexts.complete,
    cell: (row) => (
      <StatusMark state={row.isComplete ? 'ok' : 'none'}>
        {row.isComplete ? shelfKitTexts.isComplete : shelfKitTexts.isNotComplete}
      </StatusMark>
    ),
  },
];

/** What was fetched, and when. */
export const DownloadsTable = ({ downloads }: { downloads: ShelfKit['downloads'] }) =>
  downloads.length === 0 ? (
    <Text isSoft>{shelfKitTexts.noDownloads}</Text>
  ) : (
    <HairlineTable
      caption={shelfKitTexts.downloads}
      columns={columns}
      rows={downloads}
      rowKey={(row) => row.at + row.fileName}
    />
  );
