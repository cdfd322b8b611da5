import { Box } from '@chakra-ui/react/box';
import { chakra } from '@chakra-ui/react/styled-system';
import { type ReactNode, useEffect, useEffectEvent, useId, useState } from 'react';
import { uploadTexts } from '../../../config/texts/workshop-upload.js';
import { bytes } from '../../../lib/format.js';
import { droppedFiles, holdsFiles } from './dropped-files.js';

const FileInput = chakra('input', { base: { srOnly: true } });
const ChooseLabel = chakra('label', {
  base: {
    fontWeight: 'semibold',
    textDecoration: 'underline',
    textUnderlineOffset: '0.2em',
    cursor: 'pointer',
    borderRadius: 'sm',
    'input:focus-visible + &': { outline: '2px solid', outlineColor: 'ink', outlineOffset: '3px' },
  },
});

/**
 * The whole page takes a drop, so that a file let go beside the dashed box is not opened by the browser in
 * place of the workshop.
 */
function usePageDrop(onFiles: (files: File[]) => void): boolean {
  const [isOver, setIsOver] = useState(false);
  const take = useEffectEvent(onFiles);
  useEffect(() => {
    const over = (event: DragEvent) => {
      if (!holdsFiles(event)) return;
      event.preventDefault();
      setIsOver(true);
    };
    const leave = (event: DragEvent) => event.relatedTarget === null && setIsOver(false);
    const drop = (event: DragEvent) => {
      if (!holdsFiles(event) || !event.dataTransfer) return;
      event.preventDefault();
      setIsOver(false);
      void droppedFiles(event.dataTransfer).then((files) => take(files));
    };
    window.addEventListener('dragover', over);
    window.addEventListener('dragleave', leave);
    window.addEventListener('drop', drop);
    return () => {
      window.removeEventListener('dragover', over);
      window.removeEventListener('dragleave', leave);
      window.removeEventListener('drop', drop);
    };
  }, []);
  return isOver;
}

export interface DropZoneProps {
  limits: { fileBytes: number; leftBytes: number };
  onFiles: (files: File[]) => void;
  /** What is on its way. */
  children?: ReactNode;
}

/** Takes files, dropped or chosen. */
export function DropZone({ limits, onFiles, children }: DropZoneProps) {
  const id = useId();
  const isOver = usePageDrop(onFiles);
  return (
    <Box
      as="section"
      aria-label={uploadTexts.label}
      borderWidth="1px"
      borderStyle="dashed"
      borderColor={isOver ? 'ink' : 'edge'}
      outline={isOver ? '2px dashed' : undefined}
      outlineColor="ink"
      bg={isOver ? 'ground' : undefined}
      paddingInline="5"
      paddingBlock="4"
    >
      <Box>
        {isOver ? uploadTexts.dropNow : uploadTexts.drop}{' '}
        <FileInput
          id={id}
          type="file"
          multiple
          aria-describedby={`${id}-limits`}
          onChange={(event) => {
            onFiles([...(event.currentTarget.files ?? [])]);
            // The same file can then be chosen again.
            event.currentTarget.value = '';
          }}
        />
        <ChooseLabel htmlFor={id}>{uploadTexts.choose}</ChooseLabel>
      </Box>
      <Box id={`${id}-limits`} fontSize="sm" lineHeight="snug" color="ink.soft" marginTop="0.5">
        {uploadTexts.accepted} {uploadTexts.limit(bytes(limits.fileBytes), bytes(limits.leftBytes))}
      </Box>
      {children}
    </Box>
  );
}
