import { Box } from '@chakra-ui/react/box';
import type { EndpointKey, WorkshopFitReport } from '@windchest/contracts';
import { useState } from 'react';
import { fitReportTexts as texts } from '../../config/texts/workshop-fit.js';
import { useAction } from '../../lib/use-action.js';
import { Button } from '../../ui/button.js';
import { Fault } from '../../ui/fault.js';
import { SelectField } from '../../ui/field/select-field.js';
import { Text } from '../../ui/text.js';

const stale: readonly EndpointKey[] = ['GET /workshop/fit-reports/:reportId', 'GET /workshop/fit-reports'];

/** Names the revision that mends a report, or closes it. */
export function MendForm({ report }: { report: WorkshopFitReport }) {
  const [revisionId, setRevisionId] = useState(report.fixedInId ?? '');
  const mend = useAction('POST /workshop/fit-fixes', stale);
  const close = useAction('POST /workshop/fit-reports/:reportId/closing', stale);
  return (
    <Box display="grid" gap="3">
      {report.fixedIn && (
        <Text fontWeight="semibold">{texts.mended(report.fixedIn.label, report.fixedIn.isReleased)}</Text>
      )}
      {report.mayFixIn.length === 0 ? (
        <Text isSoft>{texts.noLater}</Text>
      ) : (
        <>
          <SelectField
            label={texts.mend}
            hint={texts.mendHint}
            emptyLabel={texts.chooseRevision}
            value={revisionId}
            onChange={(event) => setRevisionId(event.target.value)}
            options={report.mayFixIn.map(({ id, label, isReleased }) => ({
              value: id,
              label: isReleased ? label : texts.draft(label),
            }))}
          />
          <Button
            look="outline"
            disabled={!revisionId || revisionId === report.fixedInId}
            isBusy={mend.isRunning}
            onClick={() => void mend.run({ body: { reportIds: [report.id], revisionId } })}
          >
            {texts.setMend}
          </Button>
        </>
      )}
      {mend.fault && <Fault what={texts.mendFailed} fault={mend.fault} />}
      {report.state !== 'closed' && report.state !== 'fixed' && (
        <Button
          look="plain"
          isBusy={close.isRunning}
          onClick={() => void close.run({ params: { reportId: report.id } })}
        >
          {texts.close}
        </Button>
      )}
      {close.fault && <Fault what={texts.closeFailed} fault={close.fault} />}
    </Box>
  );
}
