import { Box } from '@chakra-ui/react/box';
import { Markdown } from '../../ui/markdown.js';

/** Markdown under a heading of the page: its own headings stay below that one in size. */
export const SmallMarkdown = ({ text }: { text: string }) => (
  <Box css={{ '& h1, & h2, & h3': { fontSize: 'md', marginTop: '4' } }}>
    <Markdown text={text} />
  </Box>
);
