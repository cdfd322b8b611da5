import { Box } from '@chakra-ui/react/box';
import type { EndpointKey, WorkshopPost } from '@windchest/contracts';
import { useState } from 'react';
import { useNavigate } from 'react-router-dom';
import { paths } from '../../config/paths.js';
import { postFormTexts as texts } from '../../config/texts/workshop-journal.js';
import { useAction } from '../../lib/use-action.js';
import { Button } from '../../ui/button.js';
import { ConfirmDialog } from '../../ui/confirm-dialog.js';
import { Fault } from '../../ui/fault.js';
import { Text } from '../../ui/text.js';

type Act = 'publish' | 'takeBack' | 'delete';
const stale: readonly EndpointKey[] = [
  'GET /workshop/posts',
  'GET /workshop/posts/:postId',
  'GET /journal',
  'GET /journal/:slug',
];

/** Publishing, taking back and deleting, each after asking. */
export function PostActs({ post, isDirty }: { post: WorkshopPost; isDirty: boolean }) {
  const [asked, setAsked] = useState<Act>();
  const navigate = useNavigate();
  const publish = useAction('POST /workshop/posts/:postId/publication', stale);
  const takeBack = useAction('DELETE /workshop/posts/:postId/publication', stale);
  const remove = useAction('DELETE /workshop/posts/:postId', ['GET /workshop/posts', 'GET /journal']);
  const params = { postId: post.id };
  const acts: Record<Act, { ask: string; what: string; confirm: string; do: () => Promise<boolean> }> = {
    publish: {
      ask: texts.publishAsk(post.title),
      what: texts.publishWhat[post.audience],
      confirm: texts.publish,
      do: async () => (await publish.run({ params })).isDone,
    },
    takeBack: {
      ask: texts.takeBackAsk(post.title),
      what: texts.takeBackWhat,
      confirm: texts.takeBack,
      do: async () => (await takeBack.run({ params })).isDone,
    },
    delete: {
      ask: texts.deleteAsk(post.title),
      what: texts.deleteWhat,
      confirm: texts.delete,
      do: async () => {
        const { isDone } = await remove.run({ params });
        if (isDone) void navigate(paths.workshop.journal.to());
        return isDone;
      },
    },
  };
  const fault = publish.fault ?? takeBack.fault ?? remove.fault;
  const act = asked && acts[asked];
  return (
    <Box display="flex" flexWrap="wrap" alignItems="center" gap="3">
      {post.state === 'draft' ? (
        <Button type="button" look="outline" disabled={isDirty} onClick={() => setAsked('publish')}>
          {texts.publish}
        </Button>
      ) : (
        <Button type="button" look="outline" onClick={() => setAsked('takeBack')}>
          {texts.takeBack}
        </Button>
      )}
      <Button type="button" look="plain" onClick={() => setAsked('delete')}>
        {texts.delete}
      </Button>
      {isDirty && post.state === 'draft' && (
        <Text look="small" isSoft>
          {texts.publishFirst}
        </Text>
      )}
      {act && (
        <ConfirmDialog
          isOpen
          onClose={() => setAsked(undefined)}
          title={act.ask}
          confirmLabel={act.confirm}
          look={asked === 'delete' ? 'stop' : undefined}
          onConfirm={act.do}
        >
          <Text>{act.what}</Text>
          {fault && <Fault what={texts.actFailed} fault={fault} />}
        </ConfirmDialog>
      )}
    </Box>
  );
}
