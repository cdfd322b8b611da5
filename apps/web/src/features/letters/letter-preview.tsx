import { Box } from '@chakra-ui/react/box';
import { chakra } from '@chakra-ui/react/styled-system';
import { useState } from 'react';
import { previewTexts as texts } from '../../config/texts/workshop-letters.js';
import { apiAddress } from '../../lib/api-address.js';
import { useAction } from '../../lib/use-action.js';
import { useEndpoint } from '../../lib/use-endpoint.js';
import { Button } from '../../ui/button.js';
import { Fault } from '../../ui/fault.js';
import { SkeletonLines } from '../../ui/skeleton-lines.js';
import { Heading, Text } from '../../ui/text.js';

const Frame = chakra('iframe', {
  base: { width: 'full', height: '38rem', borderWidth: '1px', borderColor: 'hairline', background: 'sheet' },
});
const Plain = chakra('pre', {
  base: {
    margin: '0',
    padding: '4',
    borderWidth: '1px',
    borderColor: 'hairline',
    background: 'sheet',
    whiteSpace: 'pre-wrap',
    overflowWrap: 'anywhere',
    fontFamily: 'mono',
    fontSize: 'sm',
  },
});

export interface LetterPreviewProps {
  letterId: string;
  /** When it was saved last: another time is another letter. */
  savedAt: string;
  reader: string | undefined;
  isDirty: boolean;
  mayTest: boolean;
}

/** The saved letter as one reader gets it, as HTML or as text, and a copy of it to oneself. */
export function LetterPreview({ letterId, savedAt, reader, isDirty, mayTest }: LetterPreviewProps) {
  const [isText, setIsText] = useState(false);
  const [testedAt, setTestedAt] = useState<string>();
  const query = { reader };
  const { data, fault, mutate } = useEndpoint('GET /workshop/letters/:letterId/preview', {
    params: { letterId },
    query,
  });
  const test = useAction('POST /workshop/letters/:letterId/test');
  const address = apiAddress('GET /workshop/letters/:letterId/preview.html', { params: { letterId }, query });
  return (
    <Box as="section" aria-label={texts.title}>
      <Heading level={2} marginBottom="2">
        {texts.title}
      </Heading>
      {isDirty && <Text isSoft>{texts.saveFirst}</Text>}
      {fault && !data ? (
        <Fault level={3} what={texts.failed} fault={fault} onAgain={() => void mutate()} />
      ) : !data ? (
        <SkeletonLines lines={4} />
      ) : (
        <>
          <Text overflowWrap="anywhere">{texts.to(data.to, data.subject)}</Text>
          <Box display="flex" flexWrap="wrap" gap="2" marginBlock="3">
            <Button
              type="button"
              look="outline"
              size="sm"
              aria-pressed={!isText}
              onClick={() => setIsText(false)}
            >
              {texts.asHtml}
            </Button>
            <Button
              type="button"
              look="outline"
              size="sm"
              aria-pressed={isText}
              onClick={() => setIsText(true)}
            >
              {texts.asText}
            </Button>
            {mayTest && (
              <Button
                type="button"
                look="outline"
                size="sm"
                isBusy={test.isRunning}
                disabled={isDirty}
                onClick={async () => {
                  const { isDone } = await test.run({
                    params: { letterId },
                    body: { reader: reader ?? null },
                  });
                  setTestedAt(isDone ? savedAt : undefined);
                }}
              >
                {texts.test}
              </Button>
            )}
          </Box>
          <Box role="status" fontSize="sm" color="ink.soft" marginBottom="2">
            {testedAt === savedAt ? texts.tested : ''}
          </Box>
          {test.fault && <Fault level={3} what={texts.testFailed} fault={test.fault} />}
          {isText ? (
            <Plain tabIndex={0}>{data.text}</Plain>
          ) : (
            <Frame key={`${savedAt} ${reader ?? ''}`} title={texts.frame} src={address} />
          )}
        </>
      )}
    </Box>
  );
}
