import { defineTextStyles } from '@chakra-ui/react/styled-system';

const heavy = { fontWeight: 'bold', letterSpacing: 'display', lineHeight: 'tight' } as const;

export const textStyles = defineTextStyles({
  /** The one large heading of a shop page. */
  display: { value: { ...heavy, fontSize: { base: '4xl', md: '5xl' } } },
  /** The heading of a plain page or of a workshop screen. */
  title: { value: { ...heavy, fontSize: { base: '3xl', md: '4xl' } } },
  section: { value: { fontSize: '2xl', fontWeight: 'bold', letterSpacing: 'heading', lineHeight: 'snug' } },
  subsection: { value: { fontSize: 'xl', fontWeight: 'bold', letterSpacing: 'heading', lineHeight: 'snug' } },
  /** The sentence under a large heading. */
  lead: { value: { fontSize: { base: 'lg', md: 'xl' }, lineHeight: '1.45', color: 'ink.soft' } },
  body: { value: { fontSize: 'md', lineHeight: 'normal' } },
  small: { value: { fontSize: 'sm', lineHeight: '1.45' } },
  /** Names of fields in the title block, heads of table columns. */
  label: { value: { fontSize: 'xs', fontWeight: 'medium', lineHeight: 'snug', color: 'ink.soft' } },
  /** Codes and notes lettered on a drawing. */
  lettering: { value: { fontSize: '2xs', fontWeight: 'semibold', lineHeight: '1.2' } },
});
