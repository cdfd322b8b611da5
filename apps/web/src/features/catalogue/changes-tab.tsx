import { Box } from '@chakra-ui/react/box';
import { notesTexts } from '../../config/texts/workshop-notes.js';
import { Button } from '../../ui/button.js';
import { InsertPart } from './insert-part.js';
import { useInserting } from '../../ui/markdown-editor.js';
import { NotesEditor } from './notes-editor.js';
import { useRevision } from './revision-context.js';
import { WhatDiffers } from './what-differs.js';

function ChangeHeadings() {
  const insert = useInserting();
  return (
    <Box role="group" aria-label={notesTexts.headings} flex="1 0 100%">
      <Box fontSize="sm" fontWeight="semibold" marginBottom="1.5" aria-hidden>
        {notesTexts.headings}
      </Box>
      <Box display="flex" flexWrap="wrap" gap="2">
        {notesTexts.changeHeadings.map((heading) => (
          <Button key={heading} look="outline" size="sm" onClick={() => insert.block(`### ${heading}\n\n- `)}>
            {heading}
          </Button>
        ))}
      </Box>
    </Box>
  );
}

/** What changed, under the headings of Keep a Changelog 1.1.0, and how it differs, part by part. */
export function ChangesTab() {
  const { revision } = useRevision();
  return (
    <>
      <NotesEditor
        field="changeNotes"
        label={notesTexts.changes}
        hint={notesTexts.changesHint}
        emptyPreview={notesTexts.changesEmpty}
        tools={
          <>
            <ChangeHeadings />
            <InsertPart parts={revision.parts} />
          </>
        }
      />
      <WhatDiffers />
    </>
  );
}
