import { Box } from '@chakra-ui/react/box';
import { type FormEvent, useRef } from 'react';
import { tableTexts } from '../../config/texts/furniture.js';
import { Button } from '../button.js';
import { TextField } from '../field/text-field.js';

export interface SearchBoxProps {
  label: string;
  value: string;
  onSearch: (text: string) => void;
}

/** Searches when told to, not at every letter: each search is a question to the server. */
export function SearchBox({ label, value, onSearch }: SearchBoxProps) {
  const input = useRef<HTMLInputElement>(null);
  const submit = (event: FormEvent) => {
    event.preventDefault();
    onSearch(input.current?.value.trim() ?? '');
  };
  return (
    <Box
      as="form"
      role="search"
      onSubmit={submit}
      display="flex"
      alignItems="flex-end"
      gap="2"
      flex="1 1 16rem"
      maxWidth="narrow"
    >
      <Box flex="1">
        {/* A new value from the address (Back, "Show all") starts the field afresh. */}
        <TextField key={value} label={label} type="search" defaultValue={value} ref={input} maxLength={100} />
      </Box>
      <Button type="submit" look="outline">
        {tableTexts.search}
      </Button>
    </Box>
  );
}
