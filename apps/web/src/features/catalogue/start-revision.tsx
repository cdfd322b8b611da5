import { Box } from '@chakra-ui/react/box';
import type { WorkshopKit } from '@windchest/contracts';
import { useNavigate } from 'react-router-dom';
import { paths } from '../../config/paths.js';
import { kitTexts as texts } from '../../config/texts/workshop-kits.js';
import { useAction } from '../../lib/use-action.js';
import { Button, LinkButton } from '../../ui/button.js';
import { Fault } from '../../ui/fault.js';
import { Text } from '../../ui/text.js';
import { nextLabels } from './next-labels.js';

/** Starts the next revision; whether its mark or its issue goes up says whether printed parts interchange. */
export function StartRevision({ kit }: { kit: WorkshopKit }) {
  const navigate = useNavigate();
  const { run, fault, isRunning } = useAction('POST /workshop/kits/:kitId/revisions', [
    'GET /workshop/kits/:kitId',
    'GET /workshop/kits',
  ]);
  const open = kit.revisions.find((one) => one.state === 'draft' || one.state === 'proving');
  if (open)
    return (
      <Box marginTop="4">
        <Text isSoft marginBottom="3">
          {texts.openDraft(open.label)}
        </Text>
        <LinkButton to={paths.workshop.revision.to({ kitId: kit.id, revisionId: open.id })}>
          {texts.toDraft(open.label)}
        </LinkButton>
      </Box>
    );

  const start = async (step: 'issue' | 'mark') => {
    const outcome = await run({ params: { kitId: kit.id }, body: { step } });
    if (outcome.isDone)
      void navigate(paths.workshop.revision.to({ kitId: kit.id, revisionId: outcome.data.id }));
  };
  const next = nextLabels(kit.revisions.map((one) => one.label));
  const steps = [
    { step: 'issue', label: texts.startIssue(next.issue), rule: texts.issueRule },
    { step: 'mark', label: texts.startMark(next.mark), rule: texts.markRule },
  ] as const;
  return (
    <Box marginTop="5">
      {fault && <Fault what={texts.startFailed} fault={fault} />}
      {kit.revisions.length === 0 ? (
        <Button isBusy={isRunning} onClick={() => start('issue')}>
          {texts.startFirst}
        </Button>
      ) : (
        <>
          <Box
            display="grid"
            columnGap="8"
            rowGap="5"
            gridTemplateColumns={{ base: 'minmax(0, 1fr)', sm: 'repeat(2, minmax(0, 1fr))' }}
          >
            {steps.map(({ step, label, rule }) => (
              <Box key={step}>
                <Button look="outline" isBusy={isRunning} onClick={() => start(step)}>
                  {label}
                </Button>
                <Text look="small" isSoft marginTop="2">
                  {rule}
                </Text>
              </Box>
            ))}
          </Box>
          <Text look="small" isSoft marginTop="3">
            {texts.carried}
          </Text>
        </>
      )}
    </Box>
  );
}
