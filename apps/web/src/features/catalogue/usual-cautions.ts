import { cautionTexts } from '../../config/texts/cautions.js';

/** The cautions that hold for every kit, as Markdown to start from. */
export const usualCautions = (): string =>
  cautionTexts.groups
    .map((group) => [`## ${group.name}`, group.lines.map((line) => `- ${line}`).join('\n')].join('\n\n'))
    .join('\n\n');
