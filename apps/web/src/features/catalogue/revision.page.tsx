import { Box } from '@chakra-ui/react/box';
import { Suspense, useEffect } from 'react';
import { Outlet, useParams } from 'react-router-dom';
import { paths } from '../../config/paths.js';
import { revisionTexts } from '../../config/texts/workshop-revision.js';
import { date } from '../../lib/format.js';
import { useSession } from '../../lib/session.js';
import { Fault } from '../../ui/fault.js';
import { TextAnchor, TextLink } from '../../ui/link.js';
import { Notice } from '../../ui/notice.js';
import { PageTitle } from '../../ui/page-title.js';
import { Band, SplitSheet } from '../../ui/sheet.js';
import { SkeletonLines } from '../../ui/skeleton-lines.js';
import { Tabs } from '../../ui/tabs.js';
import { Heading, Text } from '../../ui/text.js';
import { KitColour } from '../../ui/theme/kit-colour.js';
import { GatesList } from './gates-list.js';
import { ReleaseBlock } from './release-block.js';
import { type RevisionContext, useIsWritable, useRevisionDetail } from './revision-context.js';
import { ThrowAway } from './throw-away.js';
import { WithdrawAction } from './withdraw-action.js';
import { useComparedWith } from './use-compared-with.js';

const tabsOf = (params: { kitId: string; revisionId: string }, withId: string | undefined) => [
  // What is compared with stays the same from tab to tab.
  { to: paths.workshop.revision.to(params, { with: withId }), label: revisionTexts.tabs.parts },
  { to: paths.workshop.notes.to(params), label: revisionTexts.tabs.notes },
  { to: paths.workshop.specification.to(params), label: revisionTexts.tabs.specification },
  { to: paths.workshop.changes.to(params, { with: withId }), label: revisionTexts.tabs.changes },
  { to: paths.workshop.files.to(params), label: revisionTexts.tabs.files },
];

/** Why nothing can be changed here. */
function ReadOnlyLine({ revision }: Pick<RevisionContext, 'revision'>) {
  const { may } = useSession();
  const { label, state, releasedAt, withdrawn, kit } = revision;
  if (state === 'draft' || state === 'proving')
    return may('revisions:write') ? null : <Notice>{revisionTexts.noWriting}</Notice>;
  return (
    <Notice>
      {state === 'released' && releasedAt
        ? revisionTexts.final(label, date(releasedAt))
        : revisionTexts.withdrawn(label, withdrawn?.reason ?? '')}{' '}
      {may('revisions:write') && (
        <TextLink to={paths.workshop.kit.to({ kitId: kit.id })}>{revisionTexts.toKit}</TextLink>
      )}
    </Notice>
  );
}

/** One revision: its parts, words and files at the left, what its release waits for at the right. */
export function RevisionPage() {
  const { kitId = '', revisionId = '' } = useParams();
  const { withId } = useComparedWith();
  const { may } = useSession();
  const { data: revision, fault, mutate, uploaded } = useRevisionDetail(revisionId);
  const isWritable = useIsWritable(revision);
  // The last answer of the polling may be older than the last file.
  useEffect(() => {
    if (uploaded) void mutate();
  }, [uploaded, mutate]);

  if (!revision)
    return (
      <Band>
        {fault ? (
          <Fault what={revisionTexts.notFound} fault={fault} onAgain={() => void mutate()} level={2} />
        ) : (
          <SkeletonLines lines={6} />
        )}
      </Band>
    );

  const context: RevisionContext = { revision, isWritable };
  return (
    <KitColour palette={revision.kit.colour}>
      <PageTitle title={revisionTexts.title(revision.kit.name, revision.label)} />
      <SplitSheet
        asideLabel={revisionTexts.aside}
        main={
          <>
            <Text isSoft>
              <TextLink to={paths.workshop.kit.to({ kitId: revision.kit.id })}>{revision.kit.name}</TextLink>
            </Text>
            <Heading level={1}>
              {revision.label}{' '}
              <Box as="span" fontWeight="normal" color="ink.soft">
                {revisionTexts.states[revision.state]}
              </Box>
            </Heading>
            <Box marginTop="5" marginBottom="5">
              <Tabs label={revisionTexts.tabs.label} tabs={tabsOf({ kitId, revisionId }, withId)} />
            </Box>
            {isWritable && (
              <Text display={{ lg: 'none' }} marginBottom="5">
                <TextAnchor href="#release">{revisionTexts.toRelease(revision.label)}</TextAnchor>
              </Text>
            )}
            {!isWritable && (
              <Box marginBottom="5">
                <ReadOnlyLine revision={revision} />
              </Box>
            )}
            <Suspense fallback={<SkeletonLines lines={5} />}>
              <Outlet context={context} />
            </Suspense>
          </>
        }
        aside={
          <>
            <GatesList revision={revision} />
            {isWritable && <ThrowAway revision={revision} />}
            {revision.state === 'released' && may('revisions:release') && (
              <Box marginTop="8">
                <WithdrawAction revision={revision} />
              </Box>
            )}
          </>
        }
        block={<ReleaseBlock revision={revision} />}
      />
    </KitColour>
  );
}
