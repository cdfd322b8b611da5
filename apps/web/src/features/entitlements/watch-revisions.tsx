import { Box } from '@chakra-ui/react/box';
import { watchTexts as texts } from '../../config/texts/letters.js';
import { useAction } from '../../lib/use-action.js';
import { useEndpoint } from '../../lib/use-endpoint.js';
import { Fault } from '../../ui/fault.js';
import { Checkbox } from '../../ui/field/checkbox.js';

/** The switch for mails about new revisions of one kit. */
export function WatchRevisions({ slug }: { slug: string }) {
  const params = { slug };
  const { data } = useEndpoint('GET /shelf/:slug/watching', { params });
  const set = useAction('PUT /shelf/:slug/watching', ['GET /shelf/:slug/watching']);
  if (!data) return null;
  return (
    <Box marginTop="5">
      <Checkbox
        label={texts.label}
        hint={texts.hint}
        checked={data.isOn}
        disabled={set.isRunning}
        onChange={(event) => void set.run({ params, body: { isOn: event.target.checked } })}
      />
      {set.fault && <Fault what={texts.failed} fault={set.fault} />}
    </Box>
  );
}
