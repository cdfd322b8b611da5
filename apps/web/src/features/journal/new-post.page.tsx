import { postBody } from '@windchest/contracts';
import { useState } from 'react';
import { useForm } from 'react-hook-form';
import { useNavigate } from 'react-router-dom';
import { paths } from '../../config/paths.js';
import { postFormTexts as texts } from '../../config/texts/workshop-journal.js';
import { showFieldFaults } from '../../lib/form-faults.js';
import { formResolver } from '../../lib/form-resolver.js';
import { useAction } from '../../lib/use-action.js';
import { Button } from '../../ui/button.js';
import { Fault } from '../../ui/fault.js';
import { Form } from '../../ui/form.js';
import { PageTitle } from '../../ui/page-title.js';
import { Band } from '../../ui/sheet.js';
import { Heading } from '../../ui/text.js';
import { PostFields } from './post-fields.js';
import { emptyPost, postWordNames, type PostWords } from './post-form.js';

/** Drafts a post. */
export function NewPostPage() {
  const navigate = useNavigate();
  const { run, fault, isRunning } = useAction('POST /workshop/posts', ['GET /workshop/posts']);
  const [isFaultBesideField, setIsFaultBesideField] = useState(false);
  const form = useForm<PostWords, unknown, PostWords>({
    defaultValues: emptyPost,
    resolver: formResolver<PostWords, typeof postBody>(postBody),
  });
  const save = form.handleSubmit(async (body) => {
    const outcome = await run({ body });
    if (outcome.isDone) return navigate(paths.workshop.post.to({ postId: outcome.data.id }));
    setIsFaultBesideField(showFieldFaults(outcome.fault, postWordNames, form.setError));
  });
  return (
    <Band>
      <PageTitle title={texts.newTitle} />
      <Heading level={1} marginBottom="6">
        {texts.newTitle}
      </Heading>
      <Form onSubmit={save}>
        <PostFields form={form} postId={null} />
        {fault && !isFaultBesideField && <Fault what={texts.failed} fault={fault} />}
        <Button type="submit" isBusy={isRunning} busyWords={texts.saving}>
          {texts.draft}
        </Button>
      </Form>
    </Band>
  );
}
