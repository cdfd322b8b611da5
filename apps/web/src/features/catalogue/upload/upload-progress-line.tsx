import { Box } from '@chakra-ui/react/box';
import { uploadTexts } from '../../../config/texts/workshop-upload.js';
import { Button } from '../../../ui/button.js';
import { Progress } from '../../../ui/progress.js';
import { Text } from '../../../ui/text.js';
import { type UploadItem, progressOf } from './upload-item.js';
import type { UploadQueue } from './upload-queue.js';

const headOf = (progress: ReturnType<typeof progressOf>): string => {
  if (progress.isReading) return uploadTexts.reading(progress.read, progress.files);
  if (progress.isBusy) return uploadTexts.sending;
  return progress.failed > 0 ? uploadTexts.finishedWithFaults : uploadTexts.finished;
};

/** The upload as a whole: "23 of 40 files, 61 %". */
export function UploadProgressLine({ items, queue }: { items: readonly UploadItem[]; queue: UploadQueue }) {
  const progress = progressOf(items);
  const percent = Math.floor(progress.done * 100);
  const words = [
    uploadTexts.overall(progress.arrived, progress.files, percent),
    progress.failed > 0 && uploadTexts.failed(progress.failed),
  ]
    .filter(Boolean)
    .join(', ');
  const canRetry = items.some((item) => item.state.step === 'broken');
  return (
    <>
      <Progress label={headOf(progress)} done={progress.done} words={words} />
      {progress.isBusy ? (
        <Text look="small" isSoft marginTop="2">
          {uploadTexts.goesOn}
        </Text>
      ) : (
        <Box display="flex" flexWrap="wrap" gap="3" marginTop="3">
          {canRetry && (
            <Button look="outline" size="sm" onClick={() => queue.retryAll()}>
              {uploadTexts.retryAll}
            </Button>
          )}
          <Button look="plain" size="sm" onClick={() => queue.clear()}>
            {uploadTexts.clear}
          </Button>
        </Box>
      )}
    </>
  );
}
