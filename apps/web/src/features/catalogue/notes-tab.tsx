import { notesTexts } from '../../config/texts/workshop-notes.js';
import { InsertPart } from './insert-part.js';
import { NotesEditor } from './notes-editor.js';
import { useRevision } from './revision-context.js';

/** How the kit is put together. */
export function NotesTab() {
  const { revision } = useRevision();
  return (
    <NotesEditor
      field="assemblyNotes"
      label={notesTexts.assembly}
      hint={notesTexts.assemblyHint}
      emptyPreview={notesTexts.assemblyEmpty}
      tools={<InsertPart parts={revision.parts} />}
    />
  );
}
