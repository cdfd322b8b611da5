import type { RankVoice } from '@windchest/contracts';
import { roomTexts } from '../../config/texts/room.js';
import { cents, millimetres, number } from '../../lib/format.js';
import { type Column, HairlineTable } from '../../ui/table/hairline-table.js';
import { noteName } from './drawn-voices.js';
import type { PredictedVoice } from './predicted-rank.js';

interface Row extends RankVoice {
  predicted: PredictedVoice | undefined;
}

/** A vessel has no length: its note hangs on the air it holds. */
const sizeWords = ({ voice }: RankVoice) =>
  voice.kind === 'vessel' ? `${number(voice.volumeCm3, 1)} cm³` : millimetres(voice.lengthMm);

export interface VoicesTableProps {
  rank: readonly RankVoice[];
  predicted: readonly PredictedVoice[] | undefined;
  temperatureC: number;
}

/** Every voice with its note, length and cents in the chosen room. */
export function VoicesTable({ rank, predicted, temperatureC }: VoicesTableProps) {
  const byCode = new Map(predicted?.map((one) => [one.code, one]));
  const hasVessel = rank.some(({ voice }) => voice.kind === 'vessel');
  const columns: Column<Row>[] = [
    {
      key: 'note',
      header: roomTexts.note,
      isHeading: true,
      cell: ({ voice }) => noteName(voice.note),
    },
    { key: 'code', header: roomTexts.voice, cell: ({ code }) => code },
    {
      key: 'size',
      header: hasVessel ? roomTexts.size : roomTexts.length,
      isNumeric: true,
      cell: sizeWords,
    },
    {
      key: 'cents',
      header: roomTexts.sounds,
      isNumeric: true,
      cell: (row) => (row.predicted ? cents(row.predicted.cents) : '–'),
    },
    {
      key: 'unsure',
      header: roomTexts.uncertainty,
      isNumeric: true,
      cell: (row) => (row.predicted ? `± ${number(row.predicted.uncertaintyCents)}` : '–'),
    },
  ];
  return (
    <HairlineTable
      caption={roomTexts.caption(roomTexts.degrees(temperatureC))}
      columns={columns}
      rows={rank.map((one) => ({ ...one, predicted: byCode.get(one.code) }))}
      rowKey={(row) => row.code}
    />
  );
}
