import { Box } from '@chakra-ui/react/box';
import type { PostCard } from '@windchest/contracts';
import { paths } from '../../config/paths.js';
import { journalTexts as texts } from '../../config/texts/journal.js';
import { date } from '../../lib/format.js';
import { TextLink } from '../../ui/link.js';
import { KitColour } from '../../ui/theme/kit-colour.js';

/** When a post came out, for whom, and about which kit. */
export const PostFacts = ({ post }: { post: PostCard }) => (
  <Box color="ink.soft" fontSize="sm" display="flex" flexWrap="wrap" columnGap="4" rowGap="1">
    <time dateTime={post.publishedAt}>{date(post.publishedAt)}</time>
    {post.audience === 'supporters' && <span>{texts.forSupporters}</span>}
    {post.kit && (
      <KitColour palette={post.kit.colour}>
        <TextLink to={paths.kit.to({ slug: post.kit.slug })} color="kit.deep">
          {texts.about(post.kit.name)}
        </TextLink>
      </KitColour>
    )}
  </Box>
);
