import { Box } from '@chakra-ui/react/box';
import { postBody, type WorkshopPost } from '@windchest/contracts';
import { useState } from 'react';
import { useForm } from 'react-hook-form';
import { useParams } from 'react-router-dom';
import { paths } from '../../config/paths.js';
import { journalListTexts, postFormTexts as texts } from '../../config/texts/workshop-journal.js';
import { showFieldFaults } from '../../lib/form-faults.js';
import { date } from '../../lib/format.js';
import { formResolver } from '../../lib/form-resolver.js';
import { useSession } from '../../lib/session.js';
import { useAction } from '../../lib/use-action.js';
import { useEndpoint } from '../../lib/use-endpoint.js';
import { Button } from '../../ui/button.js';
import { Fault } from '../../ui/fault.js';
import { Form } from '../../ui/form.js';
import { TextLink } from '../../ui/link.js';
import { PageTitle } from '../../ui/page-title.js';
import { Band } from '../../ui/sheet.js';
import { SkeletonLines } from '../../ui/skeleton-lines.js';
import { Heading, Text } from '../../ui/text.js';
import { PostActs } from './post-acts.js';
import { PostFields } from './post-fields.js';
import { postWordNames, type PostWords, wordsOf } from './post-form.js';

function PostForm({ post }: { post: WorkshopPost }) {
  const { may } = useSession();
  const mayPublish = may('journal:publish');
  const isWritable = post.state === 'draft' || mayPublish;
  const { run, fault, isRunning } = useAction('PUT /workshop/posts/:postId', [
    'GET /workshop/posts',
    'GET /workshop/posts/:postId',
    'GET /journal',
    'GET /journal/:slug',
  ]);
  const [isFaultBesideField, setIsFaultBesideField] = useState(false);
  const [isSaved, setIsSaved] = useState(false);
  const form = useForm<PostWords, unknown, PostWords>({
    defaultValues: wordsOf(post),
    resolver: formResolver<PostWords, typeof postBody>(postBody),
  });
  const { isDirty } = form.formState;
  const save = form.handleSubmit(async (body) => {
    const outcome = await run({ params: { postId: post.id }, body });
    setIsSaved(outcome.isDone);
    if (outcome.isDone) form.reset(wordsOf(outcome.data));
    else setIsFaultBesideField(showFieldFaults(outcome.fault, postWordNames, form.setError));
  });
  return (
    <Form onSubmit={save}>
      <PostFields form={form} postId={post.id} />
      {fault && !isFaultBesideField && <Fault what={texts.failed} fault={fault} />}
      <Box display="flex" flexWrap="wrap" alignItems="center" gap="4">
        {isWritable && (
          <Button type="submit" isBusy={isRunning} busyWords={texts.saving}>
            {texts.save}
          </Button>
        )}
        {mayPublish && <PostActs post={post} isDirty={isDirty} />}
        <Box role="status" fontSize="sm" color="ink.soft">
          {isSaved && !isDirty ? texts.saved : ''}
        </Box>
      </Box>
    </Form>
  );
}

/** One post: its words, and what may be done with it. */
export function EditPostPage() {
  const { postId = '' } = useParams();
  const { data: post, fault, mutate } = useEndpoint('GET /workshop/posts/:postId', { params: { postId } });
  return (
    <Band>
      <PageTitle title={post?.title ?? journalListTexts.title} />
      <Text isSoft>
        <TextLink to={paths.workshop.journal.to()}>{journalListTexts.title}</TextLink>
      </Text>
      {fault && !post ? (
        <Fault level={1} what={texts.notFound} fault={fault} onAgain={() => void mutate()} />
      ) : !post ? (
        <SkeletonLines lines={8} />
      ) : (
        <>
          <Heading level={1}>{post.title}</Heading>
          <Text isSoft marginTop="1" marginBottom="6">
            {post.state === 'published' && post.publishedAt
              ? texts.publishedOn(date(post.publishedAt))
              : texts.isDraft}{' '}
            <TextLink to={paths.post.to({ slug: post.slug })}>{texts.seeIt}</TextLink>
          </Text>
          <PostForm key={post.id} post={post} />
        </>
      )}
    </Band>
  );
}
