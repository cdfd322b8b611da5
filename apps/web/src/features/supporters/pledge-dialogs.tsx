import { Box } from '@chakra-ui/react/box';
import type { Pledge, PledgeDeed } from '@windchest/contracts';
import { useState } from 'react';
import { ownPledgeTexts as texts, supportTexts } from '../../config/texts/pledge.js';
import { date, price } from '../../lib/format.js';
import { useAction } from '../../lib/use-action.js';
import { useEndpoint } from '../../lib/use-endpoint.js';
import { ConfirmDialog } from '../../ui/confirm-dialog.js';
import { Fault } from '../../ui/fault.js';
import { RadioRow, RadioRows } from '../../ui/field/radio-rows.js';
import { SkeletonLines } from '../../ui/skeleton-lines.js';
import { Text } from '../../ui/text.js';
import { restsWords, staysWords } from './pledge-words.js';

export const stale = ['GET /account/pledges', 'GET /shelf', 'GET /shelf/:slug'] as const;

export interface PledgeDialogProps {
  pledge: Pledge;
  /** The deed that is asked about; none closes all. */
  deed: PledgeDeed | undefined;
  onClose: () => void;
}

const nextAmount = ({ nextPlan, amount }: Pledge) => price(nextPlan?.amount ?? amount);

export function PauseDialog({ pledge, deed, onClose }: PledgeDialogProps) {
  const { run, fault } = useAction('POST /pledges/:pledgeId/pause', stale);
  const [months, setMonths] = useState<1 | 2 | 3>(1);
  return (
    <ConfirmDialog
      isOpen={deed === 'pause'}
      onClose={onClose}
      title={texts.pauseTitle}
      confirmLabel={texts.pauseConfirm}
      look="ink"
      onConfirm={async () => (await run({ params: { pledgeId: pledge.id }, body: { months } })).isDone}
    >
      <Box display="grid" gap="4">
        <RadioRows legend={texts.pauseFor}>
          {pledge.pauses.map((one) => (
            <RadioRow
              key={one.months}
              name="months"
              value={one.months}
              label={texts.months(one.months)}
              worth={
                <Box as="span" fontWeight="normal" color="ink.soft">
                  {texts.pauseNext(date(one.nextPaymentAt))}
                </Box>
              }
              checked={months === one.months}
              onChange={() => setMonths(one.months)}
            />
          ))}
        </RadioRows>
        <Text>
          {pledge.paidUntil && texts.pauseDetail(date(pledge.paidUntil))} {restsWords(pledge)}
        </Text>
        {fault && <Fault level={3} what={texts.notDone} fault={fault} />}
      </Box>
    </ConfirmDialog>
  );
}

export function PlanDialog({ pledge, deed, onClose }: PledgeDialogProps) {
  const { run, fault } = useAction('PUT /pledges/:pledgeId/plan', stale);
  const plans = useEndpoint('GET /plans', deed === 'change-plan' ? { query: { size: 100 } } : null);
  const [chosen, setChosen] = useState<string>();
  const [isMissing, setIsMissing] = useState(false);
  const others = plans.data?.items.filter(({ id }) => id !== pledge.plan.id);
  const from = pledge.pausedUntil ?? pledge.nextPaymentAt;
  const planId = chosen ?? pledge.nextPlan?.id;
  return (
    <ConfirmDialog
      isOpen={deed === 'change-plan'}
      onClose={onClose}
      title={texts.planTitle}
      confirmLabel={texts.planConfirm}
      look="ink"
      onConfirm={async () => {
        setIsMissing(!planId);
        return planId ? (await run({ params: { pledgeId: pledge.id }, body: { planId } })).isDone : false;
      }}
    >
      <Box display="grid" gap="4">
        {from && <Text>{texts.planDetail(date(from))}</Text>}
        {plans.fault ? (
          <Fault level={3} fault={plans.fault} onAgain={() => void plans.mutate()} />
        ) : !others ? (
          <SkeletonLines lines={3} />
        ) : others.length === 0 ? (
          <Text isSoft>{texts.planNone}</Text>
        ) : (
          <RadioRows legend={supportTexts.choose} error={isMissing && !planId ? texts.planChoose : undefined}>
            {others.map((plan) => (
              <RadioRow
                key={plan.id}
                name="next-plan"
                value={plan.id}
                label={plan.name}
                note={plan.hasAllKits ? supportTexts.allKits : plan.kits.map(({ name }) => name).join(', ')}
                worth={`${price(plan.amount)} ${supportTexts.aMonth}`}
                checked={planId === plan.id}
                onChange={() => setChosen(plan.id)}
              />
            ))}
          </RadioRows>
        )}
        {fault && <Fault level={3} what={texts.notDone} fault={fault} />}
      </Box>
    </ConfirmDialog>
  );
}

export function EndDialog({ pledge, deed, onClose }: PledgeDialogProps) {
  const { run, fault } = useAction('POST /pledges/:pledgeId/end', stale);
  const isPaid = pledge.state === 'current' && pledge.paidUntil;
  return (
    <ConfirmDialog
      isOpen={deed === 'end'}
      onClose={onClose}
      title={texts.endTitle}
      confirmLabel={texts.endConfirm}
      cancelLabel={texts.endKeep}
      onConfirm={async () => (await run({ params: { pledgeId: pledge.id } })).isDone}
    >
      <Text marginBottom="3">{isPaid ? texts.endDetail(date(isPaid)) : texts.endAtOnce}</Text>
      <Text>{staysWords(pledge)}</Text>
      {fault && <Fault level={3} what={texts.notDone} fault={fault} />}
    </ConfirmDialog>
  );
}

export function KeepDialog({ pledge, deed, onClose }: PledgeDialogProps) {
  const { run, fault } = useAction('POST /pledges/:pledgeId/keep', stale);
  return (
    <ConfirmDialog
      isOpen={deed === 'keep'}
      onClose={onClose}
      title={texts.keepTitle}
      confirmLabel={texts.keepConfirm}
      cancelLabel={texts.keepCancel}
      look="ink"
      onConfirm={async () => (await run({ params: { pledgeId: pledge.id } })).isDone}
    >
      <Text>{texts.keepDetail(date(pledge.paidUntil ?? pledge.endsAt ?? ''), nextAmount(pledge))}</Text>
      {fault && <Fault level={3} what={texts.notDone} fault={fault} />}
    </ConfirmDialog>
  );
}

export function ResumeDialog({ pledge, deed, onClose }: PledgeDialogProps) {
  const { run, fault } = useAction('POST /pledges/:pledgeId/resume', stale);
  const day = date(pledge.resumesAt ?? pledge.paidUntil ?? '');
  return (
    <ConfirmDialog
      isOpen={deed === 'resume'}
      onClose={onClose}
      title={texts.resumeTitle}
      confirmLabel={texts.resume}
      cancelLabel={texts.resumeKeep}
      look="ink"
      onConfirm={async () => (await run({ params: { pledgeId: pledge.id } })).isDone}
    >
      <Text>
        {pledge.state === 'paused'
          ? texts.resumeDetail(day, nextAmount(pledge))
          : texts.resumeUnpaused(day, nextAmount(pledge))}
      </Text>
      {fault && <Fault level={3} what={texts.notDone} fault={fault} />}
    </ConfirmDialog>
  );
}

export function GiveUpDialog({ pledge, deed, onClose }: PledgeDialogProps) {
  const { run, fault } = useAction('POST /pledges/:pledgeId/give-up', stale);
  return (
    <ConfirmDialog
      isOpen={deed === 'give-up'}
      onClose={onClose}
      title={texts.giveUpTitle}
      confirmLabel={texts.giveUp}
      cancelLabel={texts.giveUpKeep}
      onConfirm={async () => (await run({ params: { pledgeId: pledge.id } })).isDone}
    >
      <Text>{texts.giveUpDetail}</Text>
      {fault && <Fault level={3} what={texts.notDone} fault={fault} />}
    </ConfirmDialog>
  );
}
