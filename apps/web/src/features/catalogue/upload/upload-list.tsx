import { Box } from '@chakra-ui/react/box';
import type { RevisionDetail, RevisionFile } from '@windchest/contracts';
import { useState } from 'react';
import { uploadTexts } from '../../../config/texts/workshop-upload.js';
import { bytes } from '../../../lib/format.js';
import { Button } from '../../../ui/button.js';
import type { SignName } from '../../../ui/sign.js';
import { StatusMark } from '../../../ui/status-mark.js';
import { filesOfParts } from '../part-meshes.js';
import { isArrived, type UploadItem } from './upload-item.js';

interface Standing {
  sign: SignName;
  word: string;
  sentence?: string | null;
}

/** A file that arrived is followed on into the measuring room. */
const afterArrival = (item: UploadItem, file: RevisionFile | undefined): Standing => {
  const word = item.state.step === 'stored' ? uploadTexts.states.stored : uploadTexts.states.sent;
  switch (file?.measuring) {
    case 'waiting':
    case 'measuring':
      return { sign: 'wait', word: uploadTexts.states.measuring };
    case 'measured':
      return {
        sign: 'ok',
        word: item.state.step === 'stored' ? word : uploadTexts.states.measured,
      };
    case 'refused':
      return { sign: 'stop', word: uploadTexts.states.refused, sentence: file.fault };
    default:
      return { sign: 'ok', word };
  }
};

function standingOf(item: UploadItem, file: RevisionFile | undefined): Standing {
  const { state } = item;
  const words = uploadTexts.states;
  switch (state.step) {
    case 'hashing':
      return { sign: 'wait', word: words.hashing(Math.floor(state.done * 100)) };
    case 'sending':
      return { sign: 'wait', word: words.sending(Math.floor(state.done * 100)) };
    case 'refused':
    case 'broken':
      return { sign: 'stop', word: words[state.step], sentence: state.sentence };
    case 'stored':
    case 'sent':
      return afterArrival(item, file);
    default:
      return { sign: 'none', word: words[state.step] };
  }
}

const UploadRow = ({
  item,
  standing,
  onRetry,
}: {
  item: UploadItem;
  standing: Standing;
  onRetry: () => void;
}) => (
  <Box
    as="li"
    display="grid"
    gridTemplateColumns={{ base: 'minmax(0, 1fr) auto', sm: 'minmax(0, 1fr) 5rem 11rem' }}
    columnGap="4"
    alignItems="baseline"
    paddingBlock="1.5"
    borderBottomWidth="1px"
    borderColor="hairline"
    fontSize="sm"
  >
    <Box fontWeight="semibold" overflowWrap="anywhere">
      {item.file.name}
    </Box>
    <Box color="ink.soft" textAlign="end">
      {bytes(item.file.size)}
    </Box>
    <Box gridColumn={{ base: '1 / -1', sm: 'auto' }}>
      <StatusMark state={standing.sign} fontWeight={standing.sign === 'stop' ? 'semibold' : 'normal'}>
        {standing.word}
      </StatusMark>
    </Box>
    {standing.sentence && (
      <Box gridColumn="1 / -1" color="stop" lineHeight="snug" maxWidth="measure">
        {standing.sentence}
      </Box>
    )}
    {item.state.step === 'broken' && (
      <Box gridColumn="1 / -1">
        <Button
          look="plain"
          size="sm"
          minHeight="1.75rem"
          onClick={onRetry}
          aria-label={uploadTexts.retryOf(item.file.name)}
        >
          {uploadTexts.retry}
        </Button>
      </Box>
    )}
  </Box>
);

/** By its bytes, since the server may mend the name; by the name too where the same bytes came twice. */
const fileOf = ({ sha256, file }: UploadItem, files: readonly RevisionFile[]): RevisionFile | undefined => {
  const same = files.filter((one) => one.sha256 === sha256);
  return same.find((one) => one.fileName === file.name) ?? same[0];
};

/** A long list shows what moves and what failed; the rest on request. */
const shortList = 8;

export interface UploadListProps {
  items: readonly UploadItem[];
  revision: RevisionDetail;
  onRetry: (key: string) => void;
}

/** Every file of the upload with how far it is. */
export function UploadList({ items, revision, onRetry }: UploadListProps) {
  const [isWhole, setIsWhole] = useState(false);
  const files = [...revision.documents, ...filesOfParts(revision.parts)];
  const standing = items.map((item) => ({
    item,
    standing: standingOf(item, isArrived(item) ? fileOf(item, files) : undefined),
  }));
  const isLong = items.length > shortList;
  const shown = standing.filter(
    (one) =>
      !isLong ||
      isWhole ||
      one.standing.sign === 'stop' ||
      ['hashing', 'sending'].includes(one.item.state.step),
  );
  return (
    <>
      <Box as="ul" aria-label={uploadTexts.files} listStyle="none" marginTop="3">
        {shown.map((one) => (
          <UploadRow
            key={one.item.key}
            item={one.item}
            standing={one.standing}
            onRetry={() => onRetry(one.item.key)}
          />
        ))}
      </Box>
      {isLong && (
        <Button look="plain" size="sm" onClick={() => setIsWhole(!isWhole)} aria-expanded={isWhole}>
          {isWhole ? uploadTexts.showFewer : uploadTexts.showAll(items.length)}
        </Button>
      )}
    </>
  );
}
