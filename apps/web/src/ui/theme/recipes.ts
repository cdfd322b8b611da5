import { defineRecipe } from '@chakra-ui/react/styled-system';

const button = defineRecipe({
  className: 'button',
  base: {
    display: 'inline-flex',
    alignItems: 'center',
    justifyContent: 'center',
    gap: '2',
    borderRadius: 'sm',
    borderWidth: '1.5px',
    borderStyle: 'solid',
    borderColor: 'transparent',
    fontWeight: 'semibold',
    lineHeight: 'snug',
    textAlign: 'center',
    textDecoration: 'none',
    cursor: 'pointer',
    userSelect: 'none',
    transition: 'colors',
    transitionDuration: 'fast',
    _disabled: { cursor: 'not-allowed', bg: 'hairline', borderColor: 'hairline', color: 'ink.soft' },
  },
  variants: {
    size: {
      md: { minHeight: '2.875rem', paddingInline: '5', paddingBlock: '2', fontSize: 'md' },
      sm: { minHeight: '2.25rem', paddingInline: '3', paddingBlock: '1', fontSize: 'sm' },
    },
    // After the size, whose padding two looks change.
    look: {
      ink: {
        bg: 'ink',
        color: 'ink.contrast',
        borderColor: 'ink',
        _hover: { bg: 'ink/85' },
        _active: { bg: 'ink/75' },
      },
      outline: {
        borderColor: 'ink',
        color: 'ink',
        bg: 'sheet',
        _hover: { bg: 'hairline/50' },
        _active: { bg: 'hairline' },
      },
      stop: {
        borderColor: 'stop',
        color: 'stop',
        bg: 'sheet',
        _hover: { bg: 'stop/8' },
        _active: { bg: 'stop/14' },
      },
      plain: {
        color: 'ink',
        bg: 'transparent',
        paddingInline: '0',
        fontWeight: 'normal',
        textDecoration: 'underline',
        textDecorationColor: 'edge',
        textUnderlineOffset: '0.2em',
        _hover: { textDecorationColor: 'ink' },
        _disabled: { bg: 'transparent', borderColor: 'transparent', textDecoration: 'none' },
      },
      /** Fills the action cell of a title block. */
      cell: {
        width: 'full',
        height: 'full',
        paddingInline: '3',
        borderRadius: 'none',
        borderWidth: '0',
        bg: 'ink',
        color: 'ink.contrast',
        _hover: { bg: 'ink/85' },
        _active: { bg: 'ink/75' },
        _focusVisible: { outlineOffset: '-5px', outlineColor: 'ink.contrast' },
        _disabled: { justifyContent: 'flex-start', textAlign: 'start', opacity: 1 },
      },
    },
  },
  defaultVariants: { size: 'md', look: 'ink' },
});

/** Inputs, areas and selects are one shape: an outline to write in. */
const control = defineRecipe({
  className: 'control',
  base: {
    width: 'full',
    minHeight: '2.875rem',
    paddingInline: '3',
    paddingBlock: '2',
    bg: 'sheet',
    color: 'ink',
    fontSize: 'md',
    lineHeight: 'normal',
    borderWidth: '1px',
    borderStyle: 'solid',
    borderColor: 'edge',
    borderRadius: 'sm',
    transition: 'colors',
    transitionDuration: 'fast',
    _hover: { borderColor: 'ink' },
    _focusVisible: { outline: '2px solid', outlineColor: 'ink', outlineOffset: '-1px', borderColor: 'ink' },
    _invalid: { borderColor: 'stop', _focusVisible: { outlineColor: 'stop' } },
    _disabled: { bg: 'ground', color: 'ink.soft', cursor: 'not-allowed', borderColor: 'hairline' },
    _readOnly: { bg: 'ground' },
  },
});

export const recipes = { button, control };
