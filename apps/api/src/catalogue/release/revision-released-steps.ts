import { Injectable } from '@nestjs/common';
import { Steps } from '../../database/steps.js';

/** A revision in the transaction that releases it. */
export interface JustReleased {
  readonly revisionId: string;
  readonly label: string;
  readonly kit: { readonly id: string; readonly slug: string; readonly name: string };
}

/** Run in the transaction that releases a revision, by the rooms that have people waiting for it. */
@Injectable()
export class RevisionReleasedSteps extends Steps<JustReleased> {}
