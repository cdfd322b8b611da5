import { Module } from '@nestjs/common';
import { SequelizeModule } from '@nestjs/sequelize';
import { AccountsModule } from '../accounts/accounts.module.js';
import { CatalogueReader } from './catalogue-reader.js';
import { CatalogueWaiting } from './catalogue-waiting.js';
import { Comparison } from './comparison/comparison.js';
import { Differences } from './comparison/differences.js';
import { AttachFile } from './files/attach-file.js';
import { MeasurementRecords } from './files/measurement-records.js';
import { MeasurementRecord } from './files/measurement.model.js';
import { OfferFiles } from './files/offer-files.js';
import { RemoveFile } from './files/remove-file.js';
import { RevisionFile } from './files/revision-file.model.js';
import { StoredFile } from './files/stored-file.model.js';
import { UploadFile } from './files/upload-file.js';
import { Gates } from './gates/gates.js';
import { DraftKit } from './kits/draft-kit.js';
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
import { RequestRelease } from './release/request-release.js';
import { ChangeRevision } from './revisions/change-revision.js';
import { Drafts } from './revisions/drafts.js';
import { Part } from './revisions/part.model.js';
import { RevisionContents } from './revisions/revision-contents.js';
import { RevisionView } from './revisions/revision-view.js';
import { Revision } from './revisions/revision.model.js';
import { RevisionsController } from './revisions/revisions.controller.js';
import { StartRevision } from './revisions/start-revision.js';

@Module({
  imports: [
    AccountsModule,
    SequelizeModule.forFeature([Kit, Licence, Revision, Part, RevisionFile, StoredFile, MeasurementRecord]),
  ],
  controllers: [KitsController, WorkshopKitsController, RevisionsController],
  providers: [
    ShopKits,
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
    Differences,
    Comparison,
    Gates,
    MeasurementRecords,
    AttachFile,
    OfferFiles,
    UploadFile,
    RemoveFile,
    RequestRelease,
    BuildRelease,
    CatalogueReader,
    CatalogueWaiting,
    PrintPlans,
    RevisionReleasedSteps,
    PrintSheets,
    KitsTooBig,
  ],
  // The measuring room writes what it finds through the records.
  exports: [CatalogueReader, CatalogueWaiting, MeasurementRecords, PrintPlans, RevisionReleasedSteps],
})
export class CatalogueModule {}
