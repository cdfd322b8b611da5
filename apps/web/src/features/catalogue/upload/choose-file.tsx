import { Box } from '@chakra-ui/react/box';
import { chakra } from '@chakra-ui/react/styled-system';
import { useId } from 'react';
import { recipes } from '../../../ui/theme/recipes.js';
import { VisuallyHidden } from '../../../ui/visually-hidden.js';

const FileInput = chakra('input', { base: { srOnly: true } });
const ChooseLabel = chakra('label', recipes.button);

export interface ChooseFileProps {
  label: string;
  /** What it is for, where several stand on a page. */
  of: string;
  accept?: string;
  onFile: (file: File) => void;
}

/** A button that asks for one file. */
export function ChooseFile({ label, of, accept, onFile }: ChooseFileProps) {
  const id = useId();
  return (
    <Box position="relative">
      <FileInput
        id={id}
        type="file"
        accept={accept}
        onChange={(event) => {
          const file = event.currentTarget.files?.[0];
          if (file) onFile(file);
          // The same file can then be chosen again.
          event.currentTarget.value = '';
        }}
      />
      <ChooseLabel
        htmlFor={id}
        look="outline"
        size="sm"
        css={{
          'input:focus-visible + &': { outline: '2px solid', outlineColor: 'ink', outlineOffset: '3px' },
        }}
      >
        {label}
        <VisuallyHidden> {of}</VisuallyHidden>
      </ChooseLabel>
    </Box>
  );
}
