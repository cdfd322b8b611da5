import { Box } from '@chakra-ui/react/box';
import { chakra } from '@chakra-ui/react/styled-system';
import type { Measurement } from '@windchest/contracts';
import { changesTexts as texts } from '../../config/texts/workshop-changes.js';
import { number, signed } from '../../lib/format.js';
import { VisuallyHidden } from '../../ui/visually-hidden.js';
import type { ComparisonRow } from './part-rows.js';

const Cell = chakra('td', {
  base: { textAlign: 'end', paddingBlock: '1', paddingInlineStart: '3', whiteSpace: 'nowrap' },
});
const Name = chakra('th', {
  base: { textAlign: 'start', paddingBlock: '1', fontWeight: 'normal', color: 'ink.soft' },
});
const Head = chakra('th', {
  base: {
    textAlign: 'end',
    paddingBlock: '1',
    paddingInlineStart: '3',
    textStyle: 'label',
    fontSize: 'xs',
    whiteSpace: 'nowrap',
  },
});

/** Changes smaller than these are told as none. */
const leastMm = 0.005;
const leastPercent = 0.05;

interface Size {
  name: string;
  before: string;
  now: string;
  change: string;
}

const lengthsOf = (row: ComparisonRow): Size[] =>
  (['x', 'y', 'z'] as const).flatMap((axis) => {
    const { deviation, sizeChangeMm } = row;
    if (!deviation || !sizeChangeMm) return [];
    const [then, now] = [deviation.earlierBoxMm, deviation.boxMm].map(
      ({ min, max }) => max[axis] - min[axis],
    );
    const change = sizeChangeMm[axis];
    return {
      name: texts.sizes[axis],
      before: `${number(then ?? 0, 2)} mm`,
      now: `${number(now ?? 0, 2)} mm`,
      change: Math.abs(change) < leastMm ? texts.unknown : `${signed(change, 2)} mm`,
    };
  });

const share = (percent: number | null): string =>
  percent === null || Math.abs(percent) < leastPercent ? texts.unknown : `${signed(percent, 1)} %`;

export interface ChangedSizesProps {
  code: string;
  row: ComparisonRow;
  before: Measurement | null;
  now: Measurement | null;
  beforeLabel: string | undefined;
}

/** Box, volume and surface of a part as it was and as it is. */
export function ChangedSizes({ code, row, before, now, beforeLabel }: ChangedSizesProps) {
  if (!now || !row.sizeChangeMm) return null;
  const measured = (one: Measurement | null, what: 'volumeCm3' | 'areaCm2', unit: string) =>
    one ? `${number(one[what], 2)} ${unit}` : texts.unknown;
  const sizes: Size[] = [
    ...lengthsOf(row),
    {
      name: texts.sizes.volume,
      before: measured(before, 'volumeCm3', 'cm³'),
      now: measured(now, 'volumeCm3', 'cm³'),
      change: share(row.volumeChangePercent),
    },
    {
      name: texts.sizes.area,
      before: measured(before, 'areaCm2', 'cm²'),
      now: measured(now, 'areaCm2', 'cm²'),
      change: share(row.areaChangePercent),
    },
  ];
  return (
    <chakra.table width="full" borderCollapse="collapse" fontSize="sm" marginTop="3">
      <VisuallyHidden as="caption">{texts.caption(code)}</VisuallyHidden>
      <thead>
        <Box as="tr" borderBottomWidth="1px" borderColor="ink">
          <Head scope="col" textAlign="start" paddingInlineStart="0">
            {texts.columns.size}
          </Head>
          <Head scope="col">{texts.columns.before(beforeLabel)}</Head>
          <Head scope="col">{texts.columns.now}</Head>
          <Head scope="col">{texts.columns.change}</Head>
        </Box>
      </thead>
      <tbody>
        {sizes.map((size) => (
          <Box as="tr" key={size.name} borderBottomWidth="1px" borderColor="hairline">
            <Name scope="row">{size.name}</Name>
            <Cell color="ink.soft">{size.before}</Cell>
            <Cell>{size.now}</Cell>
            <Cell fontWeight={size.change === texts.unknown ? 'normal' : 'semibold'}>{size.change}</Cell>
          </Box>
        ))}
      </tbody>
    </chakra.table>
  );
}
