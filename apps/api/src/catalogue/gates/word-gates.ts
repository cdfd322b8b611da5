import { listed, notNeeded, open, passed, type GateCheck } from './gate-facts.js';

const PART_LINK = /\[\[([^\]\n]{1,40})\]\]/g;

export const assemblyNotes: GateCheck = ({ revision, parts }) => {
  const name = 'assembly-notes';
  const notes = revision.assemblyNotes;
  if (notes.trim() === '') return open(name, 'There are no assembly notes. Write how the parts go together.');
  const codes = new Set(parts.map((part) => part.code));
  const named = [...notes.matchAll(PART_LINK)].map((match) => match[1]!.trim());
  const unknown = [...new Set(named)].filter((code) => !codes.has(code));
  if (unknown.length > 0)
    return open(name, `The notes name parts that this revision does not have: ${listed(unknown)}.`);
  return passed(name, 'The assembly notes are there, and every part they name exists.');
};

/** The headings of Keep a Changelog 1.1.0. */
const HEADINGS = ['Added', 'Changed', 'Deprecated', 'Removed', 'Fixed', 'Security'] as const;
const HEADING_LINE = /^#{1,6}\s+(Added|Changed|Deprecated|Removed|Fixed|Security)\s*#*\s*$/i;

export const changeNotes: GateCheck = ({ revision, changes }) => {
  const name = 'change-notes';
  if (changes === null) return notNeeded(name, 'The first revision changes nothing.');
  const lines = revision.changeNotes.split(/\r?\n/);
  if (revision.changeNotes.trim() === '')
    return open(
      name,
      'There are no change notes. Say what is different for those who hold the last revision.',
    );
  const headings = lines.flatMap((line, at) => {
    const heading = HEADING_LINE.exec(line)?.[1];
    return heading ? [{ heading, at }] : [];
  });
  if (headings.length === 0)
    return open(
      name,
      `Put the change notes under headings: ${HEADINGS.map((one) => `“### ${one}”`).join(', ')}.`,
    );
  const empty = headings.filter(({ at }) => {
    const next = lines.findIndex((line, other) => other > at && /^#{1,6}\s/.test(line));
    return lines.slice(at + 1, next < 0 ? undefined : next).every((line) => line.trim() === '');
  });
  if (empty.length > 0)
    return open(
      name,
      `Nothing stands under ${listed(empty.map(({ heading }) => `“${heading}”`))} in the change notes.`,
    );
  return passed(
    name,
    `The change notes say what was ${headings.map(({ heading }) => heading.toLowerCase()).join(', ')}.`,
  );
};

export const cautions: GateCheck = ({ revision }) =>
  revision.cautions.trim() === ''
    ? open('cautions', 'There are no cautions. Say what to mind when printing, making and playing it.')
    : passed('cautions', 'The cautions are there.');
