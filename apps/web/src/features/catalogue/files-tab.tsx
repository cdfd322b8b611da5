import { Box } from '@chakra-ui/react/box';
import type { RevisionFile } from '@windchest/contracts';
import { paths } from '../../config/paths.js';
import { clearanceTexts } from '../../config/texts/clearance.js';
import { filesTexts as texts } from '../../config/texts/workshop-notes.js';
import { bytes, counted } from '../../lib/format.js';
import { LinkButton } from '../../ui/button.js';
import { EmptyState } from '../../ui/empty-state.js';
import type { SignName } from '../../ui/sign.js';
import { StatusMark } from '../../ui/status-mark.js';
import { type Column, HairlineTable } from '../../ui/table/hairline-table.js';
import { Text } from '../../ui/text.js';
import { meshesOf } from './part-meshes.js';
import { RemoveFile } from './remove-file.js';
import { useRevision } from './revision-context.js';

interface FileRow {
  file: RevisionFile;
  partCode: string | null;
}

const signs: Record<RevisionFile['measuring'], SignName> = {
  'not-a-mesh': 'none',
  waiting: 'wait',
  measuring: 'wait',
  measured: 'ok',
  refused: 'stop',
};

const columns: Column<FileRow>[] = [
  { key: 'name', header: texts.columns.name, isHeading: true, cell: ({ file }) => file.fileName },
  { key: 'kind', header: texts.columns.kind, cell: ({ file }) => texts.kinds[file.kind] },
  { key: 'size', header: texts.columns.size, isNumeric: true, cell: ({ file }) => bytes(file.bytes) },
  {
    key: 'state',
    header: texts.columns.state,
    cell: ({ file }) => (
      <Box>
        <StatusMark
          state={signs[file.measuring]}
          fontWeight={file.measuring === 'refused' ? 'semibold' : 'normal'}
        >
          {texts.states[file.measuring]}
        </StatusMark>
        {file.fault && (
          <Box lineHeight="snug" maxWidth="measure">
            {file.fault}
          </Box>
        )}
      </Box>
    ),
  },
  { key: 'part', header: texts.columns.part, cell: ({ partCode }) => partCode },
];

/** All files of the revision, those that were refused first. */
export function FilesTab() {
  const { revision, isWritable } = useRevision();
  const rows: FileRow[] = [
    ...revision.parts.flatMap((part) =>
      meshesOf(part).map(({ clearance, file }) => ({
        file,
        partCode: clearance === 'zero' ? part.code : `${part.code} ${clearanceTexts.signs[clearance]}`,
      })),
    ),
    ...revision.documents.map((file) => ({ file, partCode: null })),
  ].sort(
    (a, b) =>
      Number(b.file.measuring === 'refused') - Number(a.file.measuring === 'refused') ||
      a.file.fileName.localeCompare(b.file.fileName, 'en', { numeric: true }),
  );

  if (rows.length === 0)
    return (
      <EmptyState
        title={texts.empty}
        action={
          isWritable && (
            <LinkButton to={paths.workshop.revision.to({ kitId: revision.kit.id, revisionId: revision.id })}>
              {texts.toParts}
            </LinkButton>
          )
        }
      >
        {texts.emptyDetail}
      </EmptyState>
    );
  return (
    <>
      <Text isSoft marginBottom="2">
        {texts.total(
          counted(rows.length, 'file', 'files'),
          bytes(revision.totalBytes),
          bytes(revision.limits.revisionBytes),
        )}
      </Text>
      <HairlineTable
        caption={texts.caption}
        rows={rows}
        rowKey={({ file }) => file.id}
        columns={
          isWritable
            ? [
                ...columns,
                {
                  key: 'remove',
                  header: texts.columns.remove,
                  cell: (row) => <RemoveFile revisionId={revision.id} {...row} />,
                },
              ]
            : columns
        }
      />
    </>
  );
}
