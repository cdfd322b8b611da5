import { Box } from '@chakra-ui/react/box';
import { chakra } from '@chakra-ui/react/styled-system';
import { logTexts as texts } from '../../config/texts/workshop-people.js';
import { VisuallyHidden } from '../../ui/visually-hidden.js';
import { changesOf, pathWords } from './log-changes.js';

const longestText = 400;

const valueText = (value: unknown): string => {
  if (value === undefined || value === null || value === '') return texts.nothing;
  if (typeof value === 'boolean') return value ? texts.yes : texts.no;
  const text = typeof value === 'string' ? value : JSON.stringify(value);
  return text.length > longestText ? `${text.slice(0, longestText)} …` : text;
};

/** What a change was from and to, folded away until asked for. */
export function LogChangeList({ before, after }: { before: unknown; after: unknown }) {
  const changes = changesOf(before, after);
  if (changes.length === 0) return null;
  return (
    <chakra.details>
      <chakra.summary cursor="pointer">{texts.show(changes.length)}</chakra.summary>
      <Box as="dl" marginTop="1" fontSize="sm" lineHeight="1.45">
        {changes.map(({ path, before: old, after: now }) => (
          <Box key={path} marginTop="1">
            <Box as="dt" color="ink.soft">
              {pathWords(path)}
            </Box>
            <Box as="dd" whiteSpace="pre-line" overflowWrap="anywhere">
              <VisuallyHidden>{texts.before} </VisuallyHidden>
              <Box as="span" color="ink.soft">
                {valueText(old)}
              </Box>
              <span aria-hidden> → </span>
              <VisuallyHidden>, {texts.after} </VisuallyHidden>
              {valueText(now)}
            </Box>
          </Box>
        ))}
      </Box>
    </chakra.details>
  );
}
