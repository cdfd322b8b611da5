import { Box } from '@chakra-ui/react/box';
import { useParams } from 'react-router-dom';
import { paths, signInThenBack } from '../../config/paths.js';
import { journalTexts as texts } from '../../config/texts/journal.js';
import { useSession } from '../../lib/session.js';
import { useEndpoint } from '../../lib/use-endpoint.js';
import { LinkButton } from '../../ui/button.js';
import { Fault } from '../../ui/fault.js';
import { TextLink } from '../../ui/link.js';
import { Markdown } from '../../ui/markdown.js';
import { Notice } from '../../ui/notice.js';
import { PageTitle } from '../../ui/page-title.js';
import { Band } from '../../ui/sheet.js';
import { SkeletonLines } from '../../ui/skeleton-lines.js';
import { Heading, Text } from '../../ui/text.js';
import { pictureAddress } from './picture-address.js';
import { PostFacts } from './post-facts.js';

const Closed = ({ slug }: { slug: string }) => {
  const { isSignedIn } = useSession();
  return (
    <Notice title={texts.closed}>
      <Text>{texts.closedDetail}</Text>
      <Box display="flex" flexWrap="wrap" gap="3" marginTop="3">
        <LinkButton size="sm" to={paths.support.to()}>
          {texts.see}
        </LinkButton>
        {!isSignedIn && (
          <LinkButton size="sm" look="outline" to={signInThenBack(paths.post.to({ slug }))}>
            {texts.signIn}
          </LinkButton>
        )}
      </Box>
    </Notice>
  );
};

/** One post, or what stands before it for those it is not meant for. */
export function PostPage() {
  const { slug = '' } = useParams();
  const { data: post, fault, mutate } = useEndpoint('GET /journal/:slug', { params: { slug } });
  return (
    <Band>
      <PageTitle title={post?.title ?? texts.title} />
      <Text isSoft>
        <TextLink to={paths.journal.to()}>{texts.back}</TextLink>
      </Text>
      {fault && !post ? (
        <Box marginTop="4">
          <Fault level={1} what={texts.notThere} fault={fault} onAgain={() => void mutate()} />
        </Box>
      ) : !post ? (
        <SkeletonLines lines={8} />
      ) : (
        <Box as="article" maxWidth="measure">
          <Heading level={1}>{post.title}</Heading>
          <Box marginTop="2">
            <PostFacts post={post} />
          </Box>
          {post.lead && (
            <Text look="lead" marginTop="4">
              {post.lead}
            </Text>
          )}
          <Box marginTop="6">
            {post.body === null ? (
              <Closed slug={post.slug} />
            ) : (
              <Markdown text={post.body} pictureSrc={pictureAddress} />
            )}
          </Box>
        </Box>
      )}
    </Band>
  );
}
