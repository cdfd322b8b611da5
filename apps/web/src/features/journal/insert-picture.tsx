import { Box } from '@chakra-ui/react/box';
import type { OutputOf } from '@windchest/contracts';
import { useRef, useState } from 'react';
import { postFormTexts as texts } from '../../config/texts/workshop-journal.js';
import { apiAddress } from '../../lib/api-address.js';
import { ApiFault } from '../../lib/api-fault.js';
import { sendPicture } from '../../lib/send-picture.js';
import { Button } from '../../ui/button.js';
import { Fault } from '../../ui/fault.js';
import { useInserting } from '../../ui/markdown-editor.js';
import { Text } from '../../ui/text.js';

/** `bench in June.jpg` → `bench in June`: a first description, to be bettered by hand. */
const wordsOf = (fileName: string): string => fileName.replace(/\.[^.]+$/, '').replace(/[[\]]/g, '');

/** Sends a picture and puts it into the text where the cursor is. */
export function InsertPicture({ postId }: { postId: string | null }) {
  const insert = useInserting();
  const chooser = useRef<HTMLInputElement>(null);
  const [isSending, setIsSending] = useState(false);
  const [fault, setFault] = useState<ApiFault>();
  if (postId === null) return <Text isSoft>{texts.pictureFirst}</Text>;

  const send = async (file: File) => {
    setIsSending(true);
    setFault(undefined);
    try {
      const address = apiAddress('POST /workshop/posts/:postId/pictures', { params: { postId } });
      const sent = await sendPicture<OutputOf<'POST /workshop/posts/:postId/pictures'>>(address, file);
      insert.block(`![${wordsOf(sent.fileName)}](picture:${sent.id})`);
    } catch (thrown) {
      if (!(thrown instanceof ApiFault)) throw thrown;
      setFault(thrown);
    } finally {
      setIsSending(false);
    }
  };
  return (
    <Box>
      <input
        ref={chooser}
        type="file"
        hidden
        accept="image/png,image/jpeg,image/webp"
        aria-label={texts.picture}
        onChange={(event) => {
          const [file] = event.target.files ?? [];
          event.target.value = '';
          if (file) void send(file);
        }}
      />
      <Button
        type="button"
        look="outline"
        size="sm"
        isBusy={isSending}
        busyWords={texts.sendingPicture}
        onClick={() => chooser.current?.click()}
      >
        {texts.picture}
      </Button>
      {fault && (
        <Box marginTop="3">
          <Fault what={texts.pictureFailed} fault={fault} />
        </Box>
      )}
    </Box>
  );
}
