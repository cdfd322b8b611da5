import type { Clearance, ShelfKit } from '@windchest/contracts';
import { useId, useState } from 'react';
import { clearanceTexts } from '../../config/texts/clearance.js';
import { shelfKitTexts } from '../../config/texts/shelf.js';
import { useAction } from '../../lib/use-action.js';
import { Fault } from '../../ui/fault.js';
import { RadioRow, RadioRows } from '../../ui/field/radio-rows.js';

/** Which clearance one prints of a kit: bundle and reprint list keep to it. Kept as soon as it is said. */
export function ClearanceChoice({ kit }: { kit: ShelfKit }) {
  const name = useId();
  const { run, fault } = useAction('PUT /shelf/:slug/clearance', [
    'GET /shelf/:slug',
    'GET /shelf/:slug/printed',
    'GET /shelf/:slug/reprint',
    'GET /shelf/:slug/changed-parts',
  ]);
  const [said, setSaid] = useState<Clearance | null>();
  const { said: kept, habit, gauge } = kit.clearance;
  const shown = said === undefined ? kept : said;
  const say = async (clearance: Clearance | null) => {
    setSaid(clearance);
    await run({ params: { slug: kit.slug }, body: { clearance } });
    setSaid(undefined);
  };
  return (
    <>
      <RadioRows legend={shelfKitTexts.clearance}>
        {kit.newest.bundles.map(({ clearance }) => (
          <RadioRow
            key={clearance}
            name={name}
            value={clearance}
            label={clearanceTexts.named(clearance)}
            checked={shown === clearance}
            onChange={() => void say(clearance)}
          />
        ))}
        <RadioRow
          name={name}
          value=""
          label={
            habit
              ? shelfKitTexts.clearanceHabit(clearanceTexts.named(habit.clearance))
              : shelfKitTexts.clearanceUnknown
          }
          note={
            habit
              ? shelfKitTexts.clearanceFromCard(habit.printer)
              : shelfKitTexts.clearanceFind(gauge ? `${gauge.code} ${gauge.name}` : undefined)
          }
          checked={shown === null}
          onChange={() => void say(null)}
        />
      </RadioRows>
      {fault && <Fault level={2} what={shelfKitTexts.clearanceFailed} fault={fault} />}
    </>
  );
}
