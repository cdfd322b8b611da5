import { Box } from '@chakra-ui/react/box';
import { type ReactNode, useState } from 'react';
import { paths } from '../../config/paths.js';
import { savingTexts } from '../../config/texts/workshop-forms.js';
import { notesTexts } from '../../config/texts/workshop-notes.js';
import { useAction } from '../../lib/use-action.js';
import { Button } from '../../ui/button.js';
import { Fault } from '../../ui/fault.js';
import { Markdown } from '../../ui/markdown.js';
import { Notice } from '../../ui/notice.js';
import { Text } from '../../ui/text.js';
import { MarkdownEditor } from '../../ui/markdown-editor.js';
import { useRevision } from './revision-context.js';
import { useDraftText } from '../../lib/use-draft-text.js';

export interface NotesEditorProps {
  field: 'assemblyNotes' | 'changeNotes';
  label: string;
  hint: string;
  emptyPreview: string;
  tools: ReactNode;
}

/** One of a revision's texts: written, seen, saved when told to. */
export function NotesEditor({ field, label, hint, emptyPreview, tools }: NotesEditorProps) {
  const { revision, isWritable } = useRevision();
  const saved = revision[field];
  const draft = useDraftText(`${revision.id}.${field}`, saved);
  const [isSaved, setIsSaved] = useState(false);
  const { run, fault, isRunning } = useAction('PATCH /workshop/revisions/:revisionId', [
    'GET /workshop/revisions/:revisionId',
  ]);
  const partHref = (code: string) =>
    `${paths.workshop.revision.to({ kitId: revision.kit.id, revisionId: revision.id })}#part-${code}`;

  if (!isWritable)
    return saved.trim() ? (
      <Markdown text={saved} partHref={partHref} />
    ) : (
      <Text isSoft>{notesTexts.nothing}</Text>
    );

  const save = async () => {
    const { isDone } = await run({ params: { revisionId: revision.id }, body: { [field]: draft.text } });
    if (isDone) draft.forget();
    setIsSaved(isDone);
  };
  return (
    <Box>
      {draft.isFromBefore && (
        <Box marginBottom="4">
          <Notice tone="warn">
            {notesTexts.kept}{' '}
            <Button look="plain" size="sm" minHeight="0" paddingBlock="0" onClick={draft.forget}>
              {notesTexts.useSaved}
            </Button>
          </Notice>
        </Box>
      )}
      <MarkdownEditor
        label={label}
        hint={hint}
        value={draft.text}
        onChange={(text) => {
          setIsSaved(false);
          draft.write(text);
        }}
        emptyPreview={emptyPreview}
        partHref={partHref}
        tools={tools}
      />
      {fault && (
        <Box marginTop="4">
          <Fault what={notesTexts.failed} fault={fault} />
        </Box>
      )}
      <Box display="flex" flexWrap="wrap" alignItems="center" gap="4" marginTop="4">
        <Button
          disabled={!draft.isDirty && !isRunning}
          isBusy={isRunning}
          busyWords={savingTexts.saving}
          onClick={save}
        >
          {notesTexts.saveOf[field]}
        </Button>
        <Box role="status" color="ink.soft" fontSize="sm">
          {draft.isDirty ? notesTexts.unsaved : isSaved ? notesTexts.saved : ''}
        </Box>
      </Box>
    </Box>
  );
}
