import { Box } from '@chakra-ui/react/box';
import type { Part } from '@windchest/contracts';
import { useState } from 'react';
import { notesTexts } from '../../config/texts/workshop-notes.js';
import { Button } from '../../ui/button.js';
import { SelectField } from '../../ui/field/select-field.js';
import { useInserting } from '../../ui/markdown-editor.js';

/** Chooses a part and puts its link into the text. */
export function InsertPart({ parts }: { parts: readonly Part[] }) {
  const insert = useInserting();
  const [code, setCode] = useState('');
  return (
    <Box display="flex" alignItems="flex-end" gap="2" flex="0 1 24rem" minWidth="0">
      <Box flex="1" minWidth="0">
        <SelectField
          label={notesTexts.part}
          emptyLabel={notesTexts.choosePart}
          value={code}
          onChange={(event) => setCode(event.target.value)}
          options={parts.map((part) => ({ value: part.code, label: `${part.code} ${part.name}` }))}
        />
      </Box>
      <Button look="outline" disabled={!code} onClick={() => insert.inline(`[[${code}]]`)}>
        {notesTexts.insertPart}
      </Button>
    </Box>
  );
}
