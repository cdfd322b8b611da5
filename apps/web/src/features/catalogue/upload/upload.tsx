import { Box } from '@chakra-ui/react/box';
import type { RevisionDetail } from '@windchest/contracts';
import { UploadProgressLine } from './upload-progress-line.js';
import { DropZone } from './drop-zone.js';
import { UploadList } from './upload-list.js';
import { useUploads } from './uploads.js';

/** Where files come into a draft: the drop zone, and how far each file is. */
export function Upload({ revision }: { revision: RevisionDetail }) {
  const { items, queue } = useUploads(revision.id);
  return (
    <DropZone
      limits={{
        fileBytes: revision.limits.fileBytes,
        leftBytes: Math.max(0, revision.limits.revisionBytes - revision.totalBytes),
      }}
      onFiles={(files) => queue.add(files, revision.limits)}
    >
      {items.length > 0 && (
        <Box marginTop="4">
          <UploadProgressLine items={items} queue={queue} />
          <UploadList items={items} revision={revision} onRetry={(key) => queue.retry([key])} />
        </Box>
      )}
    </DropZone>
  );
}
