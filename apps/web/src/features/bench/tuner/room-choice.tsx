import { Box } from '@chakra-ui/react/box';
import { roomTexts } from '../../../config/texts/room.js';
import { tunerTexts as texts } from '../../../config/texts/tuner.js';
import { SelectField } from '../../../ui/field/select-field.js';
import { Text } from '../../../ui/text.js';
import { RoomSlider } from '../room-slider.js';

export interface RoomChoiceProps {
  temperatureC: number;
  /** The temperature the kit is voiced for. */
  voicedForC: number;
  isForRoom: boolean;
  /** What the room does to the voice: "should sound 514.4 Hz". */
  words: string;
  onTemperature: (temperatureC: number) => void;
  onForRoom: (isForRoom: boolean) => void;
}

/** The room one listens in, and the one the rank is tuned for. Only voices of air care. */
export const RoomChoice = ({
  temperatureC,
  voicedForC,
  isForRoom,
  words,
  onTemperature,
  onForRoom,
}: RoomChoiceProps) => (
  <Box display="grid" gap="4">
    <Box>
      <Text look="small" fontWeight="semibold">
        {texts.room}
      </Text>
      <RoomSlider temperatureC={temperatureC} onChange={onTemperature} words={words} />
    </Box>
    <SelectField
      label={texts.tuneFor}
      value={isForRoom ? 'room' : 'kit'}
      options={[
        { value: 'kit', label: texts.forKit(roomTexts.degrees(Math.round(voicedForC))) },
        { value: 'room', label: texts.forRoom },
      ]}
      onChange={(event) => onForRoom(event.target.value === 'room')}
    />
  </Box>
);
