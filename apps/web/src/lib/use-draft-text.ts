import { useState } from 'react';
import { useStoredValue } from './stored-value.js';
import { keptDraft } from './kept-draft.js';

export interface DraftText {
  text: string;
  write: (text: string) => void;
  isDirty: boolean;
  /** The words come from an earlier visit that ended before they were saved. */
  isFromBefore: boolean;
  forget: () => void;
}

/** A long text in the making: what is typed stands in the browser until it is saved. */
export function useDraftText(name: string, saved: string): DraftText {
  const draft = keptDraft(name);
  const kept = useStoredValue(draft);
  const [wasThere] = useState(kept !== null && kept !== saved);
  const [isTouched, setIsTouched] = useState(false);
  const text = kept ?? saved;
  return {
    text,
    write: (next) => {
      setIsTouched(true);
      draft.set(next === saved ? null : next);
    },
    isDirty: text !== saved,
    isFromBefore: wasThere && !isTouched && text !== saved,
    forget: () => draft.set(null),
  };
}
