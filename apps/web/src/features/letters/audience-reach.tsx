import { Box } from '@chakra-ui/react/box';
import type { AudienceAnswer } from '@windchest/contracts';
import { useEffect, useState } from 'react';
import { leftOutTexts, reachTexts as texts } from '../../config/texts/workshop-letters.js';
import { useEndpoint } from '../../lib/use-endpoint.js';
import { Button } from '../../ui/button.js';
import { Fault } from '../../ui/fault.js';
import { SelectField } from '../../ui/field/select-field.js';
import { SkeletonLines } from '../../ui/skeleton-lines.js';
import { type Column, HairlineTable } from '../../ui/table/hairline-table.js';
import { Heading, Text } from '../../ui/text.js';
import { bodyOf, type LetterForm } from './letter-form.js';

type Reader = AudienceAnswer['readers']['items'][number];
const SIZE = 10;

/** Typing is not asked about at every letter. */
function useSettled<T>(value: T, afterMs: number): T {
  const [settled, setSettled] = useState(value);
  const text = JSON.stringify(value);
  useEffect(() => {
    const timer = setTimeout(() => setSettled(JSON.parse(text) as T), afterMs);
    return () => clearTimeout(timer);
  }, [text, afterMs]);
  return settled;
}

const columnsFor = (show: 'readers' | 'left-out', onPreview?: (reader: string) => void): Column<Reader>[] => [
  {
    key: 'reader',
    header: texts.columns.reader,
    isHeading: true,
    cell: ({ name, email }) => (
      <Box overflowWrap="anywhere">
        {name && <Box fontWeight="semibold">{name}</Box>}
        <Box fontSize="sm">{email}</Box>
      </Box>
    ),
  },
  { key: 'held', header: texts.columns.holds, cell: ({ held }) => held ?? texts.nothingHeld },
  show === 'readers'
    ? {
        key: 'pieces',
        header: texts.columns.pieces,
        cell: ({ pieces, reader }) => (
          <Box display="flex" flexWrap="wrap" columnGap="3" alignItems="baseline">
            {pieces !== null && texts.pieces(pieces)}
            {onPreview && (
              <Button type="button" look="plain" size="sm" onClick={() => onPreview(reader)}>
                {texts.preview}
              </Button>
            )}
          </Box>
        ),
      }
    : {
        key: 'why',
        header: texts.columns.why,
        cell: ({ leftOut }) => (leftOut ? leftOutTexts[leftOut] : ''),
      },
];

export interface AudienceReachProps {
  form: LetterForm;
  /** Shows the letter as one reader gets it; left out where there is no saved letter. */
  onPreview?: (reader: string) => void;
  onCounted?: (size: number) => void;
}

/** How many the letter would reach now, who they are, and who is left out and why. */
export function AudienceReach({ form, onPreview, onCounted }: AudienceReachProps) {
  const { kind, kitId, revisionId, audience, leavesOutUnneeded } = bodyOf(form);
  const letter = useSettled({ kind, kitId, revisionId, audience, leavesOutUnneeded }, 400);
  const [show, setShow] = useState<'readers' | 'left-out'>('readers');
  // Another question begins at its first page.
  const asked = JSON.stringify([letter, show]);
  const [turned, setTurned] = useState({ asked, page: 1 });
  const page = turned.asked === asked ? turned.page : 1;
  const setPage = (next: number) => setTurned({ asked, page: next });
  const { data, fault, mutate } = useEndpoint(
    'POST /workshop/letters/audience',
    { body: { letter, show, page, size: SIZE } },
    { keepPreviousData: true },
  );
  const size = data?.size;
  useEffect(() => {
    if (size !== undefined) onCounted?.(size);
  }, [size, onCounted]);
  const left = (data?.leftOut ?? []).reduce((all, { count }) => all + count, 0);
  const pages = Math.max(1, Math.ceil((data?.readers.total ?? 0) / SIZE));
  return (
    <Box as="section" aria-label={texts.title}>
      <Heading level={3} look="subsection" marginBottom="2">
        {texts.title}
      </Heading>
      {fault && !data ? (
        <Fault level={3} what={texts.failed} fault={fault} onAgain={() => void mutate()} />
      ) : !data ? (
        <SkeletonLines lines={4} />
      ) : (
        <>
          <Box role="status">
            <Text look="lead">
              <strong>{texts.gets(data.size)}</strong>
              {left > 0 && <>, {texts.leftOut(left)}</>}
            </Text>
            {data.leftOut.length > 0 && (
              <Box as="ul" listStyle="none" marginTop="2" fontSize="sm" color="ink.soft">
                {data.leftOut.map(({ reason, count }) => (
                  <li key={reason}>{texts.reason(count, leftOutTexts[reason])}</li>
                ))}
              </Box>
            )}
          </Box>
          <Box maxWidth="14rem" marginTop="4" marginBottom="2">
            <SelectField
              label={texts.show}
              value={show}
              onChange={(event) => setShow(event.target.value as typeof show)}
              options={[
                { value: 'readers', label: texts.readers },
                { value: 'left-out', label: texts.notReaders },
              ]}
            />
          </Box>
          {data.readers.items.length === 0 ? (
            <Text isSoft>{texts.nobody}</Text>
          ) : (
            <HairlineTable
              caption={show === 'readers' ? texts.captionReaders : texts.captionLeftOut}
              columns={columnsFor(show, onPreview)}
              rows={data.readers.items}
              rowKey={({ reader }) => reader}
            />
          )}
          {pages > 1 && (
            <Box display="flex" alignItems="center" gap="3" marginTop="3" fontSize="sm">
              <Button
                type="button"
                look="outline"
                size="sm"
                disabled={page <= 1}
                onClick={() => setPage(page - 1)}
              >
                {texts.earlier}
              </Button>
              {texts.page(page, pages)}
              <Button
                type="button"
                look="outline"
                size="sm"
                disabled={page >= pages}
                onClick={() => setPage(page + 1)}
              >
                {texts.later}
              </Button>
            </Box>
          )}
        </>
      )}
    </Box>
  );
}
