import { useEffect, useState } from 'react';
import { copyTexts } from '../config/texts/furniture.js';
import { Button, type ButtonProps } from './button.js';

export interface CopyButtonProps extends Omit<ButtonProps, 'onClick' | 'children'> {
  text: string;
  /** The verb with its object: "Copy the code". */
  label?: string;
}

/** Copies a text and says so where the verb stood. */
export function CopyButton({ text, label = copyTexts.copy, ...button }: CopyButtonProps) {
  const [outcome, setOutcome] = useState<string>();
  useEffect(() => {
    if (!outcome) return undefined;
    const timer = setTimeout(() => setOutcome(undefined), 2500);
    return () => clearTimeout(timer);
  }, [outcome]);
  const copy = () =>
    navigator.clipboard
      .writeText(text)
      .then(() => setOutcome(copyTexts.copied))
      .catch(() => setOutcome(copyTexts.failed));
  return (
    <Button look="outline" size="sm" {...button} onClick={copy}>
      <span aria-live="polite">{outcome ?? label}</span>
    </Button>
  );
}
