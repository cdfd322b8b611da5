import { paths } from '../../config/paths.js';
import { homeTexts } from '../../config/texts/home.js';
import { useSession } from '../../lib/session.js';
import { Button, LinkButton } from '../../ui/button.js';
import { EmptyState } from '../../ui/empty-state.js';

export interface NoKitsProps {
  page: number;
  onAgain: () => void;
}

/** A shop without kits, or a page after the last one. */
export function NoKits({ page, onAgain }: NoKitsProps) {
  const { may } = useSession();
  if (page > 1)
    return (
      <EmptyState
        title={homeTexts.beyond}
        action={<LinkButton to={paths.home.to()}>{homeTexts.toFirst}</LinkButton>}
      >
        {homeTexts.beyondDetail}
      </EmptyState>
    );
  return (
    <EmptyState
      title={homeTexts.empty}
      action={
        may('kits:write') ? (
          <LinkButton to={paths.workshop.newKit.to()}>{homeTexts.emptyStaff}</LinkButton>
        ) : (
          <Button look="outline" onClick={onAgain}>
            {homeTexts.emptyAgain}
          </Button>
        )
      }
    >
      {homeTexts.emptyDetail}
    </EmptyState>
  );
}
