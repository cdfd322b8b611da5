import { lazy, type ReactNode, Suspense, useState } from 'react';
import type { PreviewedPart } from './part-turner.js';

/** Fetched when it is first asked for: what draws in three dimensions is larger than the shop. */
const PartPreviewDialog = lazy(async () => ({
  default: (await import('./part-preview-dialog.js')).PartPreviewDialog,
}));

/** The dialog in which parts are turned, and what opens it with one. */
export function useTurning(): [dialog: ReactNode, turn: (part: PreviewedPart) => void] {
  const [part, setPart] = useState<PreviewedPart>();
  const dialog = part && (
    <Suspense>
      <PartPreviewDialog part={part} onClose={() => setPart(undefined)} />
    </Suspense>
  );
  return [dialog, setPart];
}
