import { Box } from '@chakra-ui/react/box';
import { type ComponentProps, type ReactNode, useState } from 'react';
import { passphraseTexts } from '../../config/texts/account.js';
import { Checkbox } from '../../ui/field/checkbox.js';
import { TextField } from '../../ui/field/text-field.js';
import { Sign } from '../../ui/sign.js';

/** As the server counts: characters, not the parts some of them are put together from. */
export const passphraseLength = (text: string): number => [...text.normalize('NFKC')].length;

const least = 15;
/** The ruler's end: much longer is not measured. */
const longest = 30;

/** The passphrase as a length on a ruler, with a tick where it is long enough. */
const Ruler = ({ length }: { length: number }) => (
  <Box position="relative" height="0.75rem" aria-hidden>
    <Box position="absolute" insetInline="0" top="50%" height="1px" bg="hairline" />
    <Box
      position="absolute"
      left="0"
      top="50%"
      height="2px"
      marginTop="-0.5px"
      bg={length >= least ? 'ok' : 'ink'}
      transition="width"
      transitionDuration="fast"
      style={{ width: `${Math.min(1, length / longest) * 100}%` }}
    />
    {[0, least / longest, 1].map((at) => (
      <Box
        key={at}
        position="absolute"
        top="0"
        width="1px"
        height="full"
        bg={at === least / longest ? 'ink' : 'edge'}
        style={{ left: `calc(${at * 100}% - ${at}px)` }}
      />
    ))}
  </Box>
);

export interface PassphraseFieldProps extends Omit<ComponentProps<typeof TextField>, 'hint' | 'value'> {
  label: string;
  /** What is written so far, from the form's `watch`. */
  written: string;
}

/** A passphrase to be chosen: its length is told as one writes, and it can be looked at. */
export function PassphraseField({ written, ...field }: PassphraseFieldProps) {
  const [isShown, setIsShown] = useState(false);
  const length = passphraseLength(written);
  const isLongEnough = length >= least;
  const told: ReactNode =
    length === 0 ? (
      passphraseTexts.hint
    ) : isLongEnough ? (
      <Box as="span" color="ok">
        <Sign name="ok" /> {passphraseTexts.longEnough(length)}
      </Box>
    ) : (
      passphraseTexts.soFar(length, least)
    );
  return (
    <Box display="grid" gap="2">
      <TextField
        {...field}
        type={isShown ? 'text' : 'password'}
        autoComplete="new-password"
        autoCapitalize="none"
        spellCheck={false}
        hint={told}
      />
      <Ruler length={length} />
      <Checkbox
        label={passphraseTexts.show}
        checked={isShown}
        onChange={(event) => setIsShown(event.currentTarget.checked)}
      />
    </Box>
  );
}
