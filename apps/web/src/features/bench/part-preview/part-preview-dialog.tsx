import { partPreviewTexts as texts } from '../../../config/texts/part-preview.js';
import { Button } from '../../../ui/button.js';
import { Dialog } from '../../../ui/dialog.js';
import { PartTurner, type PreviewedPart } from './part-turner.js';

export interface PartPreviewDialogProps {
  part: PreviewedPart;
  onClose: () => void;
}

/** One part to look at from all sides. */
export const PartPreviewDialog = ({ part, onClose }: PartPreviewDialogProps) => (
  <Dialog
    isOpen
    onClose={onClose}
    title={texts.title(part.code, part.name)}
    actions={
      <Button look="outline" onClick={onClose}>
        {texts.close}
      </Button>
    }
  >
    <PartTurner part={part} />
  </Dialog>
);
