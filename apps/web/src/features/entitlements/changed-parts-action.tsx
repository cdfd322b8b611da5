import { Box } from '@chakra-ui/react/box';
import { useEffect, useRef } from 'react';
import { reprintTexts as texts } from '../../config/texts/reprint.js';
import { shelfKitTexts } from '../../config/texts/shelf.js';
import { bytes } from '../../lib/format.js';
import { useAction } from '../../lib/use-action.js';
import { useEndpoint } from '../../lib/use-endpoint.js';
import { Button } from '../../ui/button.js';
import { Fault } from '../../ui/fault.js';
import { Progress } from '../../ui/progress.js';
import type { Download } from './use-download.js';

const isUnderWay = (state: string | undefined) => state === 'waiting' || state === 'building';

export interface ChangedPartsActionProps {
  slug: string;
  revisionId: string;
  download: Download;
}

/** Only what is to print: made when it is asked for, then fetched by itself. */
export function ChangedPartsAction({ slug, revisionId, download }: ChangedPartsActionProps) {
  const { data } = useEndpoint(
    'GET /shelf/:slug/changed-parts',
    { params: { slug }, query: { revision: revisionId } },
    { refreshInterval: (answer) => (isUnderWay(answer?.state) ? 800 : 0) },
  );
  const { run, fault, isRunning } = useAction('POST /shelf/:slug/changed-parts', [
    'GET /shelf/:slug/changed-parts',
  ]);
  // Pressed while it was not there yet: it is fetched as soon as it is.
  const isWanted = useRef(false);
  const { start } = download;
  const sha256 = data?.file?.sha256;
  useEffect(() => {
    if (!isWanted.current || sha256 === undefined) return;
    isWanted.current = false;
    void start({ kitSlug: slug, revisionId, file: sha256 });
  }, [sha256, slug, revisionId, start]);

  if (!data || data.parts === 0) return null;
  const ask = async () => {
    const outcome = await run({ params: { slug }, body: { revisionId } });
    if (!outcome.isDone) return;
    const { file } = outcome.data;
    if (file) await start({ kitSlug: slug, revisionId, file: file.sha256 });
    else isWanted.current = true;
  };
  const failed = data.state === 'failed' && data.fault ? { title: data.fault } : undefined;
  return (
    <Box display="grid" gap="3" maxWidth="measure">
      {(fault ?? failed) && <Fault level={3} what={texts.changedFailed} fault={(fault ?? failed)!} />}
      {isUnderWay(data.state) ? (
        <Box aria-live="polite">
          <Progress
            label={texts.changedBuilding}
            done={data.state === 'building' ? data.percent / 100 : undefined}
          />
        </Box>
      ) : (
        <Box>
          <Button
            look="outline"
            isBusy={isRunning}
            busyWords={shelfKitTexts.getting}
            onClick={() => void ask()}
          >
            <span>
              {texts.getChanged(data.parts)}
              {data.file && (
                <Box as="span" fontWeight="normal">
                  {' '}
                  · {bytes(data.file.bytes)}
                </Box>
              )}
            </span>
          </Button>
        </Box>
      )}
    </Box>
  );
}
