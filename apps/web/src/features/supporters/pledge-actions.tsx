import { Box } from '@chakra-ui/react/box';
import type { Pledge, PledgeDeed } from '@windchest/contracts';
import { useState } from 'react';
import { paths } from '../../config/paths.js';
import { ownPledgeTexts as texts } from '../../config/texts/pledge.js';
import { useAction } from '../../lib/use-action.js';
import { AnchorButton, Button, LinkButton } from '../../ui/button.js';
import { Fault } from '../../ui/fault.js';
import { Heading } from '../../ui/text.js';
import { newAttempt } from '../basket/checkout-attempt.js';
import {
  EndDialog,
  GiveUpDialog,
  KeepDialog,
  PauseDialog,
  PlanDialog,
  ResumeDialog,
  stale,
} from './pledge-dialogs.js';

const dialogs = [PauseDialog, PlanDialog, EndDialog, KeepDialog, ResumeDialog, GiveUpDialog];

const words: Record<Exclude<PledgeDeed, 'card' | 'keep-plan'>, string> = {
  'give-up': texts.giveUp,
  'change-plan': texts.changePlan,
  pause: texts.pause,
  resume: texts.resume,
  end: texts.end,
  keep: texts.keep,
};

/** The service's page for another card. */
function CardButton({ pledge }: { pledge: Pledge }) {
  const { run, fault, isRunning } = useAction('POST /pledges/:pledgeId/card');
  const [isLeaving, setIsLeaving] = useState(false);
  const open = async () => {
    const outcome = await run({ params: { pledgeId: pledge.id }, body: { attempt: newAttempt() } });
    if (!outcome.isDone) return;
    setIsLeaving(true);
    window.location.assign(outcome.data.url);
  };
  return (
    <>
      <Button look="outline" onClick={open} isBusy={isRunning || isLeaving} busyWords={texts.cardOpening}>
        {texts.card}
      </Button>
      {fault && <Fault level={3} what={texts.notDone} fault={fault} />}
    </>
  );
}

function KeepPlanButton({ pledge }: { pledge: Pledge }) {
  const { run, fault, isRunning } = useAction('DELETE /pledges/:pledgeId/plan', stale);
  return (
    <>
      <Button look="outline" isBusy={isRunning} onClick={() => void run({ params: { pledgeId: pledge.id } })}>
        {texts.keepPlan(pledge.plan.name)}
      </Button>
      {fault && <Fault level={3} what={texts.notDone} fault={fault} />}
    </>
  );
}

/** All that can be done with a pledge; the most pressing thing first. */
export function PledgeActions({ pledge }: { pledge: Pledge }) {
  const [asked, setAsked] = useState<PledgeDeed>();
  const { deeds, paymentUrl, settleUrl, state } = pledge;
  const isOver = state === 'lapsed' || state === 'ended';
  return (
    <Box display="grid" gap="2.5" justifyItems="stretch">
      <Heading level={2} look="subsection" marginBottom="1">
        {texts.actions}
      </Heading>
      {paymentUrl && <AnchorButton href={paymentUrl}>{texts.goOn}</AnchorButton>}
      {settleUrl && <AnchorButton href={settleUrl}>{texts.pay}</AnchorButton>}
      {isOver && <LinkButton to={paths.support.to()}>{texts.again}</LinkButton>}
      {deeds.map((deed) => {
        if (deed === 'card') return <CardButton key={deed} pledge={pledge} />;
        if (deed === 'keep-plan') return <KeepPlanButton key={deed} pledge={pledge} />;
        const look = deed === 'end' || deed === 'give-up' ? 'stop' : deed === 'keep' ? 'ink' : 'outline';
        return (
          <Button key={deed} look={look} aria-haspopup="dialog" onClick={() => setAsked(deed)}>
            {words[deed]}
          </Button>
        );
      })}
      {state !== 'opening' && (
        <LinkButton look="plain" to={paths.shelf.to()} justifySelf="start">
          {texts.toShelf}
        </LinkButton>
      )}
      {dialogs.map((Dialog, at) => (
        <Dialog key={at} pledge={pledge} deed={asked} onClose={() => setAsked(undefined)} />
      ))}
    </Box>
  );
}
