import { chakra } from '@chakra-ui/react/styled-system';
import { type ComponentProps, useMemo } from 'react';
import ReactMarkdown from 'react-markdown';
import rehypeSanitize from 'rehype-sanitize';
import remarkGfm from 'remark-gfm';
import { markdownTexts } from '../config/texts/furniture.js';
import { linkParts, type MarkdownNode } from './part-links.js';
import { placePictures } from './placed-pictures.js';

const Prose = chakra('div', {
  base: {
    maxWidth: 'measure',
    overflowWrap: 'anywhere',
    '& > * + *': { marginTop: '3' },
    '& h1, & h2, & h3': { textStyle: 'subsection', marginTop: '6' },
    '& h4, & h5, & h6': { fontWeight: 'semibold', marginTop: '5' },
    '& > :first-child': { marginTop: '0' },
    '& a': { textDecoration: 'underline', textDecorationColor: 'edge', textUnderlineOffset: '0.2em' },
    '& a:hover': { textDecorationColor: 'currentColor' },
    '& ul': { listStyle: 'disc', paddingLeft: '1.25rem' },
    '& ol': { listStyle: 'decimal', paddingLeft: '1.5rem' },
    '& li + li, & li > ul, & li > ol': { marginTop: '1' },
    '& .task-list-item': { listStyle: 'none', marginLeft: '-1.25rem' },
    '& input[type=checkbox]': {
      appearance: 'none',
      width: '0.8em',
      height: '0.8em',
      marginRight: '1.5',
      borderWidth: '1px',
      borderColor: 'edge',
      _checked: { bg: 'ink', borderColor: 'ink' },
    },
    '& li::marker': { color: 'ink.soft', fontWeight: 'semibold' },
    '& code': { fontFamily: 'mono', fontSize: '0.9em' },
    '& pre': { overflowX: 'auto', paddingBlock: '2', borderBlockWidth: '1px', borderColor: 'hairline' },
    '& blockquote': { paddingLeft: '4', borderLeftWidth: '2px', borderColor: 'hairline', color: 'ink.soft' },
    '& img': { maxWidth: 'full', height: 'auto' },
    '& hr': { borderColor: 'hairline' },
    '& table': { width: 'full', borderCollapse: 'collapse', fontSize: 'sm' },
    '& th, & td': { textAlign: 'start', padding: '1.5', borderBottomWidth: '1px', borderColor: 'hairline' },
    '& th': { fontWeight: 'semibold', borderColor: 'ink' },
    '& strong': { fontWeight: 'semibold' },
  },
});

/** The box of `- [ ]`: it stands in a list, without a label of its own. */
const TaskBox = ({ type, checked, disabled }: ComponentProps<'input'>) => (
  <input
    type={type}
    checked={checked}
    disabled={disabled}
    readOnly
    aria-label={checked ? markdownTexts.done : markdownTexts.toDo}
  />
);

export interface MarkdownBodyProps {
  text: string;
  /** Where `[[H-03]]` leads; `#part-H-03` by default. */
  partHref?: (code: string) => string;
  /** Where the picture of `![words](picture:id)` stands; without it such pictures are left out. */
  pictureSrc?: (id: string) => string;
}

const anchorOfPart = (code: string) => `#part-${code}`;

/** Sanitized: markup in the text is dropped, links keep http, https, mailto and addresses of this shop. */
export function MarkdownBody({ text, partHref = anchorOfPart, pictureSrc }: MarkdownBodyProps) {
  const plugins = useMemo(
    () => [
      remarkGfm,
      () => (tree: MarkdownNode) => {
        linkParts(tree, partHref);
        if (pictureSrc) placePictures(tree, pictureSrc);
      },
    ],
    [partHref, pictureSrc],
  );
  return (
    <Prose>
      <ReactMarkdown components={{ input: TaskBox }} remarkPlugins={plugins} rehypePlugins={[rehypeSanitize]}>
        {text}
      </ReactMarkdown>
    </Prose>
  );
}
