import { Box } from '@chakra-ui/react/box';
import { chakra } from '@chakra-ui/react/styled-system';
import { useState } from 'react';
import { useSWRConfig } from 'swr';
import { partsTexts } from '../../config/texts/workshop-parts.js';
import { isAnswerOf, useAction } from '../../lib/use-action.js';
import { recipes } from '../../ui/theme/recipes.js';
import type { ComparisonRow } from './part-rows.js';

const Select = chakra('select', recipes.control);
const Input = chakra('input', recipes.control);
const small = { minHeight: '2.25rem', paddingBlock: '1', paddingInline: '2', fontSize: 'sm' } as const;

type Mark = ComparisonRow['mark'];
const marks = Object.keys(partsTexts.marks) as NonNullable<Mark>[];

const PlainWord = ({ row }: { row: ComparisonRow }) => {
  if (row.difference === 'new') return partsTexts.newPart;
  if (row.difference === 'dropped') return partsTexts.droppedPart;
  if (row.difference !== 'changed') return partsTexts.notNeeded;
  return (
    <>
      {row.mark ?? partsTexts.notNeeded}
      {row.reason && (
        <Box fontSize="sm" lineHeight="snug" color="ink.soft">
          {row.reason}
        </Box>
      )}
    </>
  );
};

export interface MarkFieldProps {
  revisionId: string;
  row: ComparisonRow;
  isWritable: boolean;
}

/** What buyers of the earlier revision should do about a changed part, and why; saved as soon as it is said. */
export function MarkField({ revisionId, row, isWritable }: MarkFieldProps) {
  const { mutate } = useSWRConfig();
  const [mark, setMark] = useState<Mark>(row.mark);
  const [reason, setReason] = useState(row.reason);
  const { run, fault } = useAction('PUT /workshop/revisions/:revisionId/marks');
  if (!isWritable || row.difference !== 'changed') return <PlainWord row={row} />;

  const save = async (next: { mark: Mark; reason: string }) => {
    if (next.mark === row.mark && next.reason === row.reason && !fault) return;
    const { isDone } = await run({ params: { revisionId }, body: { code: row.code, ...next } });
    // Gates and the title block count marks too.
    if (isDone)
      await mutate(
        isAnswerOf(['GET /workshop/revisions/:revisionId/comparison', 'GET /workshop/revisions/:revisionId']),
      );
  };
  return (
    <Box display="grid" gap="1.5" flex="1">
      <Select
        {...small}
        aria-label={partsTexts.markOf(row.code)}
        value={mark ?? ''}
        onChange={(event) => {
          const next = (event.target.value || null) as Mark;
          setMark(next);
          void save({ mark: next, reason });
        }}
      >
        <option value="">{partsTexts.choose}</option>
        {marks.map((one) => (
          <option key={one} value={one}>
            {partsTexts.marks[one]}
          </option>
        ))}
      </Select>
      {mark && (
        <Input
          {...small}
          aria-label={partsTexts.reasonOf(row.code)}
          placeholder={partsTexts.reason}
          maxLength={300}
          value={reason}
          onChange={(event) => setReason(event.target.value)}
          onBlur={() => void save({ mark, reason: reason.trim() })}
          onKeyDown={(event) => event.key === 'Enter' && void save({ mark, reason: reason.trim() })}
        />
      )}
      {fault && (
        <Box role="alert" fontSize="sm" color="stop" lineHeight="snug">
          {partsTexts.notSaved} {fault.detail || fault.title}
        </Box>
      )}
    </Box>
  );
}
