import { Module } from '@nestjs/common';
import { SequelizeModule } from '@nestjs/sequelize';
import { AccountsModule } from '../accounts/accounts.module.js';
import { CatalogueReader } from './catalogue-reader.js';
import { CatalogueWaiting } from './catalogue-waiting.js';
import { BuildChangedBundle } from './changed-parts/build-changed-bundle.js';
import { ChangedBundle } from './changed-parts/changed-bundle.model.js';
import { ChangedBundles } from './changed-parts/changed-bundles.js';
import { CollectChangedBundles } from './changed-parts/collect-changed-bundles.js';
import { Comparison } from './comparison/comparison.js';
import { Differences } from './comparison/differences.js';
import { MeshComparisonRecord } from './comparison/mesh-comparison.model.js';
import { MeshComparisons } from './comparison/mesh-comparisons.js';
import { QueueComparisons } from './comparison/queue-comparisons.js';
import { AttachFile } from './files/attach-file.js';
import { MeshPlaces } from './files/mesh-places.js';
import { MeasurementRecords } from './files/measurement-records.js';
import { MeasurementRecord } from './files/measurement.model.js';
import { OfferFiles } from './files/offer-files.js';
import { PartPreviews } from './files/part-previews.js';
import { RemoveFile } from './files/remove-file.js';
import { RenewMeasurements } from './files/renew-measurements.js';
import { RevisionFile } from './files/revision-file.model.js';
import { StoredFile } from './files/stored-file.model.js';
import { UploadFile } from './files/upload-file.js';
import { GateWaiver } from './gates/gate-waiver.model.js';
import { Gates } from './gates/gates.js';
import { WaiveGate } from './gates/waive-gate.js';
import { DraftKit } from './kits/draft-kit.js';
import { KitInShopSteps } from './kits/kit-in-shop-steps.js';
import { KitPageHead } from './kits/kit-page-head.js';
import { Kit } from './kits/kit.model.js';
import { KitsController } from './kits/kits.controller.js';
import { Licence } from './kits/licence.model.js';
import { OfferedLicences } from './kits/offered-licences.js';
import { PriceLicence } from './kits/price-licence.js';
import { ShopKits } from './kits/shop-kits.js';
import { WorkshopKitsController } from './kits/workshop-kits.controller.js';
import { WorkshopKits } from './kits/workshop-kits.js';
import { KitsTooBig } from './print/kits-too-big.js';
import { PrintPlans } from './print/print-plans.js';
import { PrintSheets } from './print/print-sheets.js';
import { BuildRelease } from './release/build-release.js';
import { RevisionReleasedSteps } from './release/revision-released-steps.js';
import { ReleasedBundles } from './release/released-bundles.js';
import { RequestRelease } from './release/request-release.js';
import { RevisionWithdrawnSteps, WithdrawRevision } from './release/withdraw-revision.js';
import { TidyDraft } from './release/tidy-draft.js';
import { RevisionBundle } from './release/revision-bundle.model.js';
import { ChangeRevision } from './revisions/change-revision.js';
import { ChangeVariants } from './revisions/change-variants.js';
import { Drafts } from './revisions/drafts.js';
import { PartVariant } from './revisions/part-variant.model.js';
import { Part } from './revisions/part.model.js';
import { RevisionContents } from './revisions/revision-contents.js';
import { RevisionView } from './revisions/revision-view.js';
import { Revision } from './revisions/revision.model.js';
import { RevisionsController } from './revisions/revisions.controller.js';
import { StartRevision } from './revisions/start-revision.js';

@Module({
  imports: [
    AccountsModule,
    SequelizeModule.forFeature([
      Kit,
      Licence,
      Revision,
      RevisionBundle,
      Part,
      PartVariant,
      RevisionFile,
      StoredFile,
      MeasurementRecord,
      MeshComparisonRecord,
      GateWaiver,
      ChangedBundle,
    ]),
  ],
  controllers: [KitsController, WorkshopKitsController, RevisionsController],
  providers: [
    ShopKits,
    KitInShopSteps,
    KitPageHead,
    WorkshopKits,
    DraftKit,
    PriceLicence,
    OfferedLicences,
    Drafts,
    RevisionContents,
    RevisionView,
    StartRevision,
    ChangeRevision,
    ChangeVariants,
    Differences,
    MeshComparisons,
    QueueComparisons,
    Comparison,
    Gates,
    WaiveGate,
    MeasurementRecords,
    RenewMeasurements,
    PartPreviews,
    MeshPlaces,
    AttachFile,
    OfferFiles,
    UploadFile,
    RemoveFile,
    ReleasedBundles,
    RequestRelease,
    TidyDraft,
    BuildRelease,
    CatalogueReader,
    CatalogueWaiting,
    PrintPlans,
    PrintSheets,
    KitsTooBig,
    RevisionReleasedSteps,
    RevisionWithdrawnSteps,
    WithdrawRevision,
    ChangedBundles,
    BuildChangedBundle,
    CollectChangedBundles,
  ],
  // The measuring room writes what it finds through the records.
  exports: [
    CatalogueReader,
    KitInShopSteps,
    CatalogueWaiting,
    MeasurementRecords,
    MeshComparisons,
    PrintPlans,
    RevisionReleasedSteps,
    RevisionWithdrawnSteps,
    ChangedBundles,
  ],
})
export class CatalogueModule {}
