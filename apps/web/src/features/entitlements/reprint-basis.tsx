import type { ReprintList } from '@windchest/contracts';
import { reprintTexts as texts } from '../../config/texts/reprint.js';
import { Notice } from '../../ui/notice.js';
import { Text } from '../../ui/text.js';

const listed = (names: readonly string[]) =>
  names.length < 2 ? names.join('') : `${names.slice(0, -1).join(', ')} and ${names.at(-1)}`;

/** From what a list is made, and what another mark means for it. */
export function ReprintBasis({ list }: { list: ReprintList }) {
  const { from, to, breaks, parts } = list;
  const labels = listed(from.labels);
  const isEmpty = parts.every(({ advice }) => advice === null);
  return (
    <>
      {breaks && (
        <Notice tone="warn" title={texts.breaksTitle(listed(breaks.from), breaks.to)}>
          {texts.breaks(listed(breaks.from), breaks.to)}
        </Notice>
      )}
      <Text isSoft maxWidth="measure">
        {from.basis === 'nothing'
          ? texts.fromNothing
          : from.basis === 'held'
            ? texts.fromHeld(labels)
            : texts.fromRecord(labels)}
        {isEmpty && ` ${texts.nothing(to.label)}`}
      </Text>
    </>
  );
}
