import { partPreviewTexts as texts } from '../../../config/texts/part-preview.js';
import { Button } from '../../../ui/button.js';

export interface TurnButtonProps {
  code: string;
  onTurn: () => void;
}

/** Opens one part to turn about. */
export const TurnButton = ({ code, onTurn }: TurnButtonProps) => (
  <Button
    look="plain"
    size="sm"
    minHeight="1.5rem"
    paddingBlock="0"
    aria-haspopup="dialog"
    aria-label={texts.openOf(code)}
    onClick={onTurn}
  >
    {texts.open}
  </Button>
);
