import { mailedLinkTexts } from '../../config/texts/account.js';
import { paths } from '../../config/paths.js';
import { LinkButton } from '../../ui/button.js';
import { Fault } from '../../ui/fault.js';
import { SkeletonLines } from '../../ui/skeleton-lines.js';
import { Text } from '../../ui/text.js';
import type { MailedToken } from './mailed-token.js';

export interface MailedLinkStateProps {
  token: Pick<MailedToken, 'hasToken' | 'fault'> & { again?: () => void };
  /** Where a new link is asked for. */
  freshAt?: string;
}

/** Until a mailed link has worked: that it is looked at, that it is cut off, or why it is refused. */
export function MailedLinkState({ token, freshAt = paths.signIn.to() }: MailedLinkStateProps) {
  const askAgain = (
    <LinkButton look="outline" size="sm" to={freshAt}>
      {mailedLinkTexts.askAgain}
    </LinkButton>
  );
  if (!token.hasToken)
    return (
      <Fault level={2} fault={{ title: mailedLinkTexts.noToken, detail: mailedLinkTexts.noTokenDetail }}>
        {askAgain}
      </Fault>
    );
  if (!token.fault)
    return (
      <>
        <Text isSoft>{mailedLinkTexts.checking}</Text>
        <SkeletonLines lines={2} />
      </>
    );
  const { code } = token.fault;
  const isGone = code === 'not-found' || code === 'link-is-used-up' || code === 'link-has-expired';
  return (
    <Fault
      level={2}
      what={isGone ? undefined : mailedLinkTexts.failed}
      fault={isGone ? { title: mailedLinkTexts.failed, detail: token.fault.detail } : token.fault}
      onAgain={isGone ? undefined : token.again}
    >
      {isGone && askAgain}
    </Fault>
  );
}
