import type { Letter, OutputOf } from '@windchest/contracts';
import type { SignName } from '../../ui/sign.js';

type Recipient = OutputOf<'GET /workshop/letters/:letterId/recipients'>['items'][number];

export const letterSigns: Record<Letter['state'], SignName> = {
  draft: 'none',
  scheduled: 'wait',
  sending: 'wait',
  paused: 'warn',
  cancelled: 'stop',
  sent: 'ok',
};

export const recipientSigns: Record<Recipient['state'], SignName> = {
  queued: 'wait',
  'handed-over': 'wait',
  sent: 'ok',
  refused: 'stop',
  bounced: 'stop',
  'left-out': 'none',
};
