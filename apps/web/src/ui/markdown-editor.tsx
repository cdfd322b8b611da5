import { Box } from '@chakra-ui/react/box';
import { createContext, type ReactNode, useContext, useDeferredValue, useRef } from 'react';
import { editorTexts } from '../config/texts/furniture.js';
import { TextArea } from './field/text-field.js';
import type { FieldCommon } from './field/field.js';
import { Markdown } from './markdown.js';
import { Text } from './text.js';
import { withBlock, withInserted } from './insert-text.js';

export interface Inserting {
  /** Within the line, where the cursor is. */
  inline: (piece: string) => void;
  /** On a line of its own. */
  block: (piece: string) => void;
}

const InsertingContext = createContext<Inserting>({ inline: () => {}, block: () => {} });

/** For tools of an editor: puts something into its text. */
export const useInserting = () => useContext(InsertingContext);

export interface MarkdownEditorProps {
  label: string;
  hint?: string;
  error?: FieldCommon['error'];
  value: string;
  onChange: (text: string) => void;
  rows?: number;
  /** Stands in the preview while nothing is written. */
  emptyPreview?: string;
  partHref?: (code: string) => string;
  pictureSrc?: (id: string) => string;
  /** Buttons that put something in, by `useInserting`. */
  tools?: ReactNode;
}

/** Markdown beside what it becomes. */
export function MarkdownEditor({
  label,
  hint,
  error,
  value,
  onChange,
  rows = 22,
  emptyPreview = editorTexts.nothing,
  partHref,
  pictureSrc,
  tools,
}: MarkdownEditorProps) {
  const area = useRef<HTMLTextAreaElement>(null);
  // The preview may lag behind the typing, never the other way round.
  const shown = useDeferredValue(value);
  const insertBy = (insert: typeof withInserted) => (piece: string) => {
    const field = area.current;
    const selection = {
      start: field?.selectionStart ?? value.length,
      end: field?.selectionEnd ?? value.length,
    };
    const next = insert(value, piece, selection);
    onChange(next.text);
    requestAnimationFrame(() => {
      field?.focus();
      field?.setSelectionRange(next.cursor, next.cursor);
    });
  };
  return (
    <Box>
      {tools && (
        <Box display="flex" flexWrap="wrap" alignItems="flex-end" gap="2" marginBottom="3">
          <InsertingContext value={{ inline: insertBy(withInserted), block: insertBy(withBlock) }}>
            {tools}
          </InsertingContext>
        </Box>
      )}
      <Box
        display="grid"
        gap="6"
        gridTemplateColumns={{ base: 'minmax(0, 1fr)', lg: 'repeat(2, minmax(0, 1fr))' }}
      >
        <TextArea
          label={label}
          hint={hint}
          error={error}
          isFixedPitch
          rows={rows}
          ref={area}
          value={value}
          onChange={(event) => onChange(event.target.value)}
        />
        <Box as="section" aria-label={`${editorTexts.preview}: ${label}`} minWidth="0">
          <Text look="label" fontSize="sm" paddingBottom="1.5" borderBottomWidth="1px" borderColor="hairline">
            {editorTexts.preview}
          </Text>
          <Box marginTop="3" overflowX="auto">
            {shown.trim() ? (
              <Markdown text={shown} partHref={partHref} pictureSrc={pictureSrc} />
            ) : (
              <Text isSoft>{emptyPreview}</Text>
            )}
          </Box>
        </Box>
      </Box>
    </Box>
  );
}
