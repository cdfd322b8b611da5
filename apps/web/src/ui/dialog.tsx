import { Box } from '@chakra-ui/react/box';
import { chakra } from '@chakra-ui/react/styled-system';
import { type ReactNode, useEffect, useId, useRef } from 'react';
import { Heading } from './text.js';

const DialogElement = chakra('dialog', {
  base: {
    width: 'min(34rem, calc(100vw - 2rem))',
    maxHeight: 'calc(100dvh - 2rem)',
    margin: 'auto',
    padding: '0',
    bg: 'sheet',
    color: 'ink',
    borderWidth: '1px',
    borderColor: 'ink',
    borderRadius: 'sm',
    overflow: 'auto',
    _backdrop: { bg: 'oklch(15% 0.03 258 / 0.55)' },
  },
});

export interface DialogProps {
  isOpen: boolean;
  onClose: () => void;
  title: string;
  children: ReactNode;
  /** Buttons at the foot, the main one last. */
  actions?: ReactNode;
}

/** The browser's own modal dialog: it holds the focus, makes the page inert and closes by Escape. */
export function Dialog({ isOpen, onClose, title, children, actions }: DialogProps) {
  const ref = useRef<HTMLDialogElement>(null);
  const id = useId();
  useEffect(() => {
    const dialog = ref.current;
    if (isOpen && dialog && !dialog.open) dialog.showModal();
    else if (!isOpen) dialog?.close();
  }, [isOpen]);
  return (
    <DialogElement ref={ref} aria-labelledby={id} onClose={onClose}>
      {isOpen && (
        <>
          <Box paddingInline="6" paddingTop="5" paddingBottom="6">
            <Heading level={2} look="subsection" id={id} marginBottom="3">
              {title}
            </Heading>
            {children}
          </Box>
          {actions && (
            <Box
              display="flex"
              flexWrap="wrap"
              justifyContent="flex-end"
              gap="2"
              paddingInline="6"
              paddingBlock="4"
              borderTopWidth="1px"
              borderColor="ink"
            >
              {actions}
            </Box>
          )}
        </>
      )}
    </DialogElement>
  );
}
