import { Module } from '@nestjs/common';
import { SequelizeModule } from '@nestjs/sequelize';
import { AccountsModule } from '../accounts/accounts.module.js';
import { CatalogueModule } from '../catalogue/catalogue.module.js';
import { OrdersModule } from '../orders/orders.module.js';
import { SupportersModule } from '../supporters/supporters.module.js';
import { Collections } from './collections.js';
import { DeliveryController } from './delivery.controller.js';
import { DownloadLink } from './download-link.model.js';
import { DownloadLinks } from './download-links.js';
import { Download } from './download.model.js';
import { Entitlement } from './entitlement.model.js';
import { FollowOrderRights } from './follow-order-rights.js';
import { FileGrants } from './file-grants.js';
import { GiftMail } from './gift-mail.js';
import { GiveEntitlements } from './give-entitlements.js';
import { Holdings } from './holdings.js';
import { Holders } from './holders.js';
import { ChangedParts } from './reprint/changed-parts.js';
import { KeepPrintRecord } from './reprint/keep-print-record.js';
import { PrintRecordController } from './reprint/print-record.controller.js';
import { PrintRecord } from './reprint/print-record.model.js';
import { PrintRecords } from './reprint/print-records.js';
import { ReprintPlans } from './reprint/reprint-plans.js';
import { ReprintLists } from './reprint/reprint-lists.js';
import { OwnRevisions } from './own-revisions.js';
import { PledgeEntitlements } from './pledge-entitlements.js';
import { ReaderParts } from './reader-parts.js';
import { ServeFile } from './serve-file.js';
import { ShelfController } from './shelf.controller.js';
import { Shelf } from './shelf.js';
import { Withdrawals } from './withdrawals/withdrawals.js';
import { WithdrawalsController } from './withdrawals/withdrawals.controller.js';
import { SignedAddress } from './signed-address.js';

@Module({
  imports: [
    AccountsModule,
    CatalogueModule,
    OrdersModule,
    SupportersModule,
    SequelizeModule.forFeature([Entitlement, DownloadLink, Download, PrintRecord]),
  ],
  controllers: [ShelfController, PrintRecordController, WithdrawalsController, DeliveryController],
  providers: [
    DownloadLinks,
    SignedAddress,
    FileGrants,
    ServeFile,
    GiftMail,
    GiveEntitlements,
    FollowOrderRights,
    PledgeEntitlements,
    Collections,
    Shelf,
    Holders,
    Holdings,
    PrintRecords,
    ReprintLists,
    KeepPrintRecord,
    OwnRevisions,
    ReprintPlans,
    ChangedParts,
    Withdrawals,
    ReaderParts,
  ],
  exports: [Holdings, DownloadLinks, ReaderParts, ReprintLists],
})
export class EntitlementsModule {}
