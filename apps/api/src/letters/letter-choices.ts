import { Injectable } from '@nestjs/common';
import type { LetterChoices as Choices } from '@windchest/contracts';
import { PeopleParts } from '../accounts/people-parts.js';
import { CatalogueReader } from '../catalogue/catalogue-reader.js';
import { InjectConfig, type Config } from '../config/config.js';
import { ReporterParts } from '../fit/reporter-parts.js';
import { BuyerParts } from '../orders/buyer-parts.js';

/** What an audience can be built from: facts that somebody fits. */
@Injectable()
export class LetterChoices {
  constructor(
    @InjectConfig() private readonly config: Config,
    private readonly catalogue: CatalogueReader,
    private readonly people: PeopleParts,
    private readonly reporters: ReporterParts,
    private readonly buyers: BuyerParts,
  ) {}

  async all(): Promise<Choices> {
    const [kits, printers, reports, countries] = await Promise.all([
      this.catalogue.releasedKits(),
      this.people.printerChoices(),
      this.reporters.choices(),
      this.buyers.countries(),
    ]);
    const revisions = await Promise.all(kits.map(({ id }) => this.catalogue.revisionsOf(id)));
    return {
      kits: kits.map(({ id, name }, at) => ({
        id,
        name,
        revisions: (revisions[at] ?? []).map((one) => ({ id: one.id, label: one.label })),
        reportedParts: reports.partsByKit.get(id) ?? [],
      })),
      materials: [...new Set([...printers.materials, ...reports.materials])].sort((a, b) =>
        a.localeCompare(b),
      ),
      nozzlesMm: [...new Set([...printers.nozzlesMm, ...reports.nozzlesMm])].sort((a, b) => a - b),
      countries,
      perMinute: this.config.LETTERS_PER_MINUTE,
    };
  }
}
