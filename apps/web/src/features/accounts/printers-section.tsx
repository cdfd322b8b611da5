import { Box } from '@chakra-ui/react/box';
import { mostPrinterCards, type PrinterCard } from '@windchest/contracts';
import { lazy, Suspense, useState } from 'react';
import { ownPrintersTexts as texts } from '../../config/texts/printer.js';
import { useAction } from '../../lib/use-action.js';
import { useEndpoint } from '../../lib/use-endpoint.js';
import { Button } from '../../ui/button.js';
import { ConfirmDialog } from '../../ui/confirm-dialog.js';
import { EmptyState } from '../../ui/empty-state.js';
import { Fault } from '../../ui/fault.js';
import { SkeletonLines } from '../../ui/skeleton-lines.js';
import { Text } from '../../ui/text.js';
import { KeepOffer } from '../bench/keep-offer.js';
import { AccountSection } from './account-section.js';
import { PrinterRow } from './printer-row.js';

const PrinterCardDialog = lazy(async () => ({
  default: (await import('../bench/printer-card-dialog.js')).PrinterCardDialog,
}));

const stale = ['GET /account/printers'] as const;

/** One's own printers: which there are, and which is mostly printed on. */
export function PrintersSection() {
  const { data: cards, fault, mutate } = useEndpoint('GET /account/printers');
  const [editing, setEditing] = useState<PrinterCard | 'new'>();
  const [leaving, setLeaving] = useState<PrinterCard>();
  const changing = useAction('PUT /account/printers/:printerId', stale);
  const removing = useAction('DELETE /account/printers/:printerId', stale);
  if (!cards)
    return (
      <AccountSection title={texts.heading}>
        {fault ? (
          <Fault what={texts.failed} fault={fault} onAgain={() => void mutate()} />
        ) : (
          <SkeletonLines lines={3} />
        )}
      </AccountSection>
    );

  const next = leaving?.isMain ? cards.find(({ id }) => id !== leaving.id) : undefined;
  const isFull = cards.length >= mostPrinterCards;
  const write = (
    <Button look="outline" aria-haspopup="dialog" onClick={() => setEditing('new')}>
      {texts.add}
    </Button>
  );
  return (
    <AccountSection title={texts.heading}>
      <Box display="grid" gap="4" gridTemplateColumns="minmax(0, 1fr)" justifyItems="start">
        <KeepOffer />
        {changing.fault && <Fault what={texts.mainFailed} fault={changing.fault} />}
        {cards.length === 0 ? (
          <EmptyState level={3} title={texts.none} action={write}>
            {texts.noneDetail}
          </EmptyState>
        ) : (
          <>
            <Box as="ul" listStyle="none" width="full" borderTopWidth="1px" borderColor="hairline">
              {cards.map((card) => (
                <PrinterRow
                  key={card.id}
                  card={card}
                  onChange={() => setEditing(card)}
                  onMakeMain={() =>
                    void changing.run({ params: { printerId: card.id }, body: { ...card, isMain: true } })
                  }
                  onRemove={() => setLeaving(card)}
                />
              ))}
            </Box>
            {isFull ? <Text isSoft>{texts.full(mostPrinterCards)}</Text> : write}
          </>
        )}
      </Box>
      {editing && (
        <Suspense>
          <PrinterCardDialog
            card={editing === 'new' ? null : { ...editing, key: editing.id }}
            hasOthers={cards.length > (editing === 'new' ? 0 : 1)}
            onClose={() => setEditing(undefined)}
          />
        </Suspense>
      )}
      <ConfirmDialog
        isOpen={leaving !== undefined}
        onClose={() => setLeaving(undefined)}
        title={texts.removeTitle(leaving?.name ?? '')}
        confirmLabel={texts.remove}
        onConfirm={async () =>
          leaving !== undefined && (await removing.run({ params: { printerId: leaving.id } })).isDone
        }
      >
        <Text>
          {texts.removeDetail} {next && texts.removeMainDetail(next.name)}
        </Text>
        {removing.fault && <Fault what={texts.removeFailed} fault={removing.fault} />}
      </ConfirmDialog>
    </AccountSection>
  );
}
