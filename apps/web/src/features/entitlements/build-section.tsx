import { Box } from '@chakra-ui/react/box';
import type { PrintRecordView, ShelfKit } from '@windchest/contracts';
import { useState } from 'react';
import { reprintTexts as texts } from '../../config/texts/reprint.js';
import { useAction } from '../../lib/use-action.js';
import { useEndpoint } from '../../lib/use-endpoint.js';
import { Button } from '../../ui/button.js';
import { ConfirmDialog } from '../../ui/confirm-dialog.js';
import { Details } from '../../ui/details.js';
import { PartsSheet } from '../../ui/drawing/parts-sheet.js';
import { Fault } from '../../ui/fault.js';
import { SelectField } from '../../ui/field/select-field.js';
import { SkeletonLines } from '../../ui/skeleton-lines.js';
import { type Column, HairlineTable } from '../../ui/table/hairline-table.js';
import { Text } from '../../ui/text.js';

type Part = PrintRecordView['parts'][number];
const touched = [
  'GET /shelf/:slug/printed',
  'GET /shelf/:slug/reprint',
  'GET /shelf/:slug/changed-parts',
  'GET /shelf/:slug',
  'GET /shelf',
] as const;
const sumOf = (numbers: readonly number[]) => numbers.reduce((sum, one) => sum + one, 0);

function PiecesField({
  part,
  onSay,
  isBusy,
}: {
  part: Part;
  onSay: (quantity: number) => void;
  isBusy: boolean;
}) {
  const { code, printed, quantity } = part;
  return (
    <Box as="span" display="inline-flex" alignItems="center" gap="2" whiteSpace="nowrap">
      <Button
        look="outline"
        size="sm"
        aria-label={texts.less(code)}
        disabled={isBusy || printed === 0}
        onClick={() => onSay(printed - 1)}
      >
        {texts.lessSign}
      </Button>
      <Box as="span" minWidth="4.5ch" textAlign="center" aria-live="polite">
        {texts.printedOf(printed, quantity)}
      </Box>
      <Button
        look="outline"
        size="sm"
        aria-label={texts.more(code)}
        disabled={isBusy || printed >= quantity}
        onClick={() => onSay(printed + 1)}
      >
        {texts.moreSign}
      </Button>
    </Box>
  );
}

/** How far somebody's build is: what is printed is filled, as a print has layer lines. */
export function BuildSection({
  kit,
  onPrinted,
}: {
  kit: ShelfKit;
  onPrinted: (revision: ShelfKit['newest']) => void;
}) {
  const [chosen, setChosen] = useState<string>();
  const [isForgetting, setIsForgetting] = useState(false);
  const revision = kit.revisions.find(({ id }) => id === chosen) ?? kit.held ?? kit.newest;
  const { data, fault, mutate } = useEndpoint(
    'GET /shelf/:slug/printed',
    { params: { slug: kit.slug }, query: { revision: revision.id } },
    { keepPreviousData: true },
  );
  const saying = useAction('PUT /shelf/:slug/printed', touched);
  const forgetting = useAction('DELETE /shelf/:slug/printed', touched);
  if (!data)
    return fault ? (
      <Fault what={texts.failed} fault={fault} level={3} onAgain={() => void mutate()} />
    ) : (
      <SkeletonLines lines={3} />
    );

  const { label } = data.revision;
  const printed = sumOf(data.parts.map((part) => Math.min(part.printed, part.quantity)));
  const all = sumOf(data.parts.map((part) => part.quantity));
  const say = (code: string, quantity: number) =>
    saying.run({ params: { slug: kit.slug }, body: { revisionId: revision.id, code, quantity } });
  const columns: readonly Column<Part>[] = [
    {
      key: 'part',
      header: texts.part,
      isHeading: true,
      cell: ({ code, name }) => (
        <span>
          <Box as="b" fontWeight="bold">
            {code}
          </Box>{' '}
          {name}
        </span>
      ),
    },
    {
      key: 'printed',
      header: texts.pieces,
      isNumeric: true,
      cell: (part) => (
        <PiecesField
          part={part}
          isBusy={saying.isRunning}
          onSay={(quantity) => void say(part.code, quantity)}
        />
      ),
    },
  ];
  return (
    <Box display="grid" gap="5" gridTemplateColumns="minmax(0, 1fr)">
      <Text>
        {data.isKept || !kit.held ? texts.buildLead(printed, all, label) : texts.buildAssumed(kit.held.label)}
      </Text>
      {kit.revisions.length > 1 && (
        <Box maxWidth="20rem">
          <SelectField
            label={texts.buildRevision}
            options={kit.revisions.map((one) => ({ value: one.id, label: one.label }))}
            value={revision.id}
            onChange={(event) => setChosen(event.currentTarget.value)}
          />
        </Box>
      )}
      <PartsSheet
        label={texts.buildSheet(label)}
        parts={data.parts.flatMap(({ drawing, code, name, printed: done, quantity }) =>
          drawing ? { ...drawing, code, name, isToReprint: done >= quantity } : [],
        )}
      />
      {saying.fault && <Fault what={texts.sayFailed} fault={saying.fault} level={3} />}
      <Details summary={texts.showParts}>
        <HairlineTable
          caption={texts.buildSheet(label)}
          columns={columns}
          rows={data.parts}
          rowKey={({ code }) => code}
        />
      </Details>
      <Box display="flex" flexWrap="wrap" gap="3">
        {(!data.isKept || printed < all) && (
          <Button look="outline" onClick={() => onPrinted(revision)}>
            {texts.all(label)}
          </Button>
        )}
        {data.isKept && (
          <Button look="plain" onClick={() => setIsForgetting(true)}>
            {texts.forget}
          </Button>
        )}
      </Box>
      <ConfirmDialog
        isOpen={isForgetting}
        onClose={() => setIsForgetting(false)}
        title={texts.forgetTitle}
        confirmLabel={texts.forgetConfirm}
        onConfirm={async () => (await forgetting.run({ params: { slug: kit.slug } })).isDone}
      >
        <Text>{texts.forgetDetail}</Text>
        {forgetting.fault && <Fault what={texts.forgetFailed} fault={forgetting.fault} />}
      </ConfirmDialog>
    </Box>
  );
}
