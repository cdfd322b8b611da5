import { Module } from '@nestjs/common';
import { SequelizeModule } from '@nestjs/sequelize';
import { AccountsModule } from '../accounts/accounts.module.js';
import { CatalogueModule } from '../catalogue/catalogue.module.js';
import { EntitlementsModule } from '../entitlements/entitlements.module.js';
import { FitModule } from '../fit/fit.module.js';
import { OrdersModule } from '../orders/orders.module.js';
import { AudienceQuery } from './audience-query.js';
import { Audience } from './audience.js';
import { BeginLetter } from './begin-letter.js';
import { ClaimRecipients } from './claim-recipients.js';
import { DeadAddresses } from './dead-addresses.js';
import { LetterChoices } from './letter-choices.js';
import { LetterDesk } from './letter-desk.js';
import { LetterMatters } from './letter-matter.js';
import { Letter } from './letter.model.js';
import { ListRecipients } from './list-recipients.js';
import { MailLetter } from './mail-letter.js';
import { NewsController } from './news.controller.js';
import { NewsReaders } from './news-readers.js';
import { PreviewLetter } from './preview-letter.js';
import { ReadLetters } from './read-letters.js';
import { RecipientRecord } from './recipient-record.js';
import { ReprintBooks } from './reprint-book.js';
import { RevisionWatchers } from './revision-watchers.js';
import { SendLetter } from './send-letter.js';
import { SendingController } from './sending.controller.js';
import { ShowLetters } from './show-letters.js';
import { SteerLetter } from './steer-letter.js';
import { StopMails } from './stop-mails.js';
import { TakeBounce } from './take-bounce.js';
import { TellOfRevision } from './tell-of-revision.js';
import { WorkshopLettersController } from './workshop-letters.controller.js';
import { WriteLetters } from './write-letters.js';

@Module({
  imports: [
    AccountsModule,
    CatalogueModule,
    OrdersModule,
    EntitlementsModule,
    FitModule,
    SequelizeModule.forFeature([Letter]),
  ],
  controllers: [WorkshopLettersController, SendingController, NewsController],
  providers: [
    LetterMatters,
    ReprintBooks,
    AudienceQuery,
    Audience,
    LetterDesk,
    ShowLetters,
    WriteLetters,
    LetterChoices,
    PreviewLetter,
    BeginLetter,
    SteerLetter,
    ClaimRecipients,
    RecipientRecord,
    MailLetter,
    SendLetter,
    ListRecipients,
    DeadAddresses,
    NewsReaders,
    RevisionWatchers,
    TellOfRevision,
    StopMails,
    TakeBounce,
    ReadLetters,
  ],
  exports: [ShowLetters],
})
export class LettersModule {}
