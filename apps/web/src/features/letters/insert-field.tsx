import { Box } from '@chakra-ui/react/box';
import type { LetterField } from '@windchest/contracts';
import { letterFormTexts as texts } from '../../config/texts/workshop-letters.js';
import { Button } from '../../ui/button.js';
import { useInserting } from '../../ui/markdown-editor.js';

const alone: readonly LetterField[] = ['reprint_list', 'download_link'];

/** Buttons that put a field into the letter: those that become a table or a button on a line of their own. */
export function InsertField() {
  const insert = useInserting();
  return (
    <Box
      role="group"
      aria-label={texts.fieldsLegend}
      display="flex"
      flexWrap="wrap"
      alignItems="center"
      gap="2"
    >
      <Box fontSize="sm" color="ink.soft" aria-hidden>
        {texts.fieldsLegend}
      </Box>
      {(Object.entries(texts.fields) as [LetterField, string][]).map(([field, label]) => (
        <Button
          key={field}
          type="button"
          look="outline"
          size="sm"
          onClick={() => (alone.includes(field) ? insert.block : insert.inline)(`{${field}}`)}
        >
          {label}
        </Button>
      ))}
    </Box>
  );
}
