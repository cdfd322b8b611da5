import { paths } from '../../config/paths.js';
import { tunerTexts } from '../../config/texts/tuner.js';
import { LinkButton } from '../../ui/button.js';
import { EmptyState } from '../../ui/empty-state.js';
import { PageTitle } from '../../ui/page-title.js';
import { Band } from '../../ui/sheet.js';
import { Heading } from '../../ui/text.js';
import { KitColour } from '../../ui/theme/kit-colour.js';
import { Tuner } from '../bench/tuner/tuner.js';
import { ShelfKitAnswer } from './shelf-kit-answer.js';

/** Tunes the voices of a kit on the shelf by ear of the microphone. */
export const TunerPage = () => (
  <ShelfKitAnswer address={(slug) => paths.tuner.to({ slug })}>
    {(kit) => {
      const [first, ...more] = kit.rank;
      const title = tunerTexts.title(kit.name);
      if (!first)
        return (
          <Band>
            <PageTitle title={title} />
            <Heading level={1} marginBottom="6">
              {title}
            </Heading>
            <EmptyState
              title={tunerTexts.noVoices}
              action={
                <LinkButton to={paths.shelfKit.to({ slug: kit.slug })}>
                  {tunerTexts.toKit(kit.name)}
                </LinkButton>
              }
            >
              {tunerTexts.noVoicesDetail}
            </EmptyState>
          </Band>
        );
      return (
        <KitColour palette={kit.colour}>
          <PageTitle title={title} />
          <Tuner
            kit={kit}
            rank={[first, ...more]}
            revision={(kit.held ?? kit.newest).label}
            back={paths.shelfKit.to({ slug: kit.slug })}
          />
        </KitColour>
      );
    }}
  </ShelfKitAnswer>
);
