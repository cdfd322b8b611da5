import { clearanceSigns, type ReprintList, type ReprintPart } from '@windchest/contracts';

/** A line of a reprint list as an e-mail shows it. */
export interface ReprintLine {
  readonly code: string;
  readonly name: string;
  /** Pieces to print. */
  readonly quantity: number;
  /** Then the old ones may stay where they do not trouble. */
  readonly isOnlyIfItTroubles: boolean;
  readonly why: string;
}

/** What there is to print, most urgent first; nothing of parts that stay, are left over, or are not asked for. */
export const reprintLines = (list: ReprintList): ReprintLine[] =>
  (['print', 'if-it-troubles'] as const).flatMap((advice) =>
    list.parts.filter((part) => part.advice === advice).map(lineOf),
  );

const lineOf = (part: ReprintPart): ReprintLine => ({
  code: part.code,
  name: part.clearance ? `${part.name}, in ${clearanceSigns[part.clearance]}` : part.name,
  quantity: part.advice === 'print' ? part.print : part.optional,
  isOnlyIfItTroubles: part.advice === 'if-it-troubles',
  why: whyOf(part),
});

const whyOf = ({ steps, whatDiffers }: ReprintPart): string => {
  const reasons = new Set(steps.map(({ reason }) => reason).filter((reason) => reason !== ''));
  return reasons.size > 0 ? [...reasons].join(' · ') : sentence(whatDiffers);
};

const sentence = (words: string): string => words.charAt(0).toUpperCase() + words.slice(1);
