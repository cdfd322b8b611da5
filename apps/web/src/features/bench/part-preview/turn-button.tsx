import { lazy, Suspense, useState } from 'react';
import { partPreviewTexts as texts } from '../../../config/texts/part-preview.js';
import { Button } from '../../../ui/button.js';
import type { PreviewedPart } from './part-turner.js';

/** Fetched when it is first asked for: what draws in three dimensions is larger than the shop. */
const PartPreviewDialog = lazy(async () => ({
  default: (await import('./part-preview-dialog.js')).PartPreviewDialog,
}));

export interface TurnButtonProps {
  part: PreviewedPart;
  isShort?: boolean;
}

/** Opens one part to turn about. */
export function TurnButton({ part, isShort }: TurnButtonProps) {
  const [isOpen, setIsOpen] = useState(false);
  return (
    <>
      <Button
        look="plain"
        size="sm"
        minHeight="1.5rem"
        paddingBlock="0"
        aria-haspopup="dialog"
        aria-label={isShort ? texts.openShortOf(part.code) : texts.openOf(part.code)}
        onClick={() => setIsOpen(true)}
      >
        {isShort ? texts.openShort : texts.open}
      </Button>
      {isOpen && (
        <Suspense>
          <PartPreviewDialog part={part} onClose={() => setIsOpen(false)} />
        </Suspense>
      )}
    </>
  );
}
