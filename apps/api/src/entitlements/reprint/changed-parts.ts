import { Injectable } from '@nestjs/common';
import { clearanceSigns, type Answer, type ReprintList, type ReprintPart } from '@windchest/contracts';
import { CatalogueReader } from '../../catalogue/catalogue-reader.js';
import { ChangedBundles, type ChangedBundleState } from '../../catalogue/changed-parts/changed-bundles.js';
import type { ChangedPartsNeed } from '../../catalogue/changed-parts/changed-parts-need.js';
import type { SignedIn } from '../../http/person.js';
import { Refusal } from '../../http/refusal.js';
import { withdrawnRefusal } from '../file-grants.js';
import { ReprintLists } from './reprint-lists.js';
import { ReprintPlans } from './reprint-plans.js';

type Told = Answer<'GET /shelf/:slug/changed-parts'>;

/** The bundle of what somebody has to print for a revision, and the notes. */
@Injectable()
export class ChangedParts {
  constructor(
    private readonly catalogue: CatalogueReader,
    private readonly bundles: ChangedBundles,
    private readonly plans: ReprintPlans,
    private readonly lists: ReprintLists,
  ) {}

  async look(person: SignedIn, slug: string, revisionId?: string): Promise<Told> {
    const { need } = await this.needOf(person, slug, revisionId);
    return told(need, need.parts.length > 0 ? await this.bundles.stateOf(need) : null);
  }

  /** @throws Refusal `conflict` where there is nothing to print, `forbidden` for a withdrawn revision */
  async ask(person: SignedIn, slug: string, revisionId?: string): Promise<Told> {
    const { need, kitId } = await this.needOf(person, slug, revisionId);
    const revision = await this.catalogue.revisionById(need.revisionId);
    if (revision?.isWithdrawn) throw withdrawnRefusal(revision);
    if (need.parts.length === 0)
      throw new Refusal(
        'conflict',
        `There is nothing to print for ${revision?.label}: what you have is it already.`,
      );
    return told(need, await this.bundles.ask(kitId, need));
  }

  private async needOf(
    person: SignedIn,
    slug: string,
    revisionId?: string,
  ): Promise<{ kitId: string; need: ChangedPartsNeed }> {
    const { kitId, kitName, revision } = await this.plans.find(person, slug, revisionId, 'newest');
    const { list, printed } = await this.lists.withState(person, kitId, revision.id);
    return {
      kitId,
      need: {
        revisionId: revision.id,
        clearance: printed.clearance,
        parts: list.parts
          .filter(({ print, optional }) => print + optional > 0)
          .map(({ code, print, optional }) => ({ code, print, optional })),
        list: listText(kitName, list),
      },
    };
  }
}

const told = (need: ChangedPartsNeed, state: ChangedBundleState | null): Told => ({
  revisionId: need.revisionId,
  parts: need.parts.length,
  state: state?.state ?? 'not-asked',
  percent: state?.percent ?? 0,
  fault: state?.fault ?? null,
  file: state?.file ?? null,
});

/** `reprint-list.md` of the bundle. */
export const listText = (kitName: string, { to, breaks, parts }: ReprintList): string => {
  const section = (
    title: string,
    some: readonly ReprintPart[],
    line: (part: ReprintPart) => string,
  ): string[] => (some.length === 0 ? [] : ['', `## ${title}`, '', ...some.map((part) => `- ${line(part)}`)]);
  const of = (advice: ReprintPart['advice']) => parts.filter((part) => part.advice === advice);
  return [
    `# ${kitName} ${to.label}: what to print`,
    ...(breaks
      ? [
          '',
          `Printed parts of ${breaks.from.join(' and ')} do not go with ${breaks.to}: print all of it anew, and do not mix them.`,
        ]
      : []),
    ...section('To print', of('print'), (part) => lineOf(part, part.print)),
    ...section('If it troubles you', of('if-it-troubles'), (part) => lineOf(part, part.optional)),
    ...section('Left over', of('fewer'), ({ code, name, spare }) => `${code} ${name}: ${spare} ×`),
    ...section('No longer in the kit', of('dropped'), ({ code, name }) => `${code} ${name}`),
  ].join('\n');
};

const lineOf = ({ code, name, clearance, whatDiffers, steps }: ReprintPart, pieces: number): string => {
  const reasons = steps
    .filter(({ reason }) => reason !== '')
    .map(({ revision, reason }) => `${revision}: ${reason}`);
  return [
    `${code} ${name}${clearance ? `, in ${clearanceSigns[clearance]}` : ''}: ${pieces} ×`,
    ...(whatDiffers === '' ? [] : [whatDiffers]),
    ...reasons,
  ].join('; ');
};
