import { paths } from '../../config/paths.js';
import { noKitsTexts } from '../../config/texts/no-kits.js';
import { useSession } from '../../lib/session.js';
import { Button, LinkButton } from '../../ui/button.js';
import { EmptyState } from '../../ui/empty-state.js';
import { fitsWords } from './fits-words.js';
import type { Fits } from './kit-list-query.js';

export interface NoKitsProps {
  page: number;
  fits: Fits | undefined;
  onAgain: () => void;
}

/** A shop without kits, or a page after the last one. */
export function NoKits({ page, fits, onAgain }: NoKitsProps) {
  const { may } = useSession();
  if (page > 1)
    return (
      <EmptyState
        title={noKitsTexts.beyond}
        action={<LinkButton to={paths.home.to()}>{noKitsTexts.toFirst}</LinkButton>}
      >
        {noKitsTexts.beyondDetail}
      </EmptyState>
    );
  if (fits)
    return (
      <EmptyState
        title={noKitsTexts.fitsNone(fitsWords(fits))}
        action={<LinkButton to={paths.home.to()}>{noKitsTexts.fitsAll}</LinkButton>}
      >
        {noKitsTexts.fitsNoneDetail}
      </EmptyState>
    );
  return (
    <EmptyState
      title={noKitsTexts.empty}
      action={
        may('kits:write') ? (
          <LinkButton to={paths.workshop.newKit.to()}>{noKitsTexts.emptyStaff}</LinkButton>
        ) : (
          <Button look="outline" onClick={onAgain}>
            {noKitsTexts.emptyAgain}
          </Button>
        )
      }
    >
      {noKitsTexts.emptyDetail}
    </EmptyState>
  );
}
