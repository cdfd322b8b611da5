import { Module } from '@nestjs/common';
import { PassportModule } from '@nestjs/passport';
import { SequelizeModule } from '@nestjs/sequelize';
import { AccountController } from './account.controller.js';
import { AccountLinks } from './account-links.js';
import { Join } from './join.js';
import { LocalStrategy } from './local.strategy.js';
import { MailedLinks } from './mailed-links.js';
import { OneTimeToken } from './one-time-token.model.js';
import { OneTimeTokens } from './one-time-tokens.js';
import { OwnSessions } from './own-sessions.js';
import { Passphrases } from './passphrases.js';
import { AddressVerifiedSteps, People } from './people.js';
import { PeopleParts } from './people-parts.js';
import { Person } from './person.model.js';
import { ChangePrinterCards } from './printers/change-printer-cards.js';
import { PrinterCardRecord } from './printers/printer-card.model.js';
import { PrinterCards } from './printers/printer-cards.js';
import { PrintersController } from './printers/printers.controller.js';
import { SessionController } from './session.controller.js';
import { SessionRecord } from './session.model.js';
import { SessionSerializer } from './session-serializer.js';
import { SessionView } from './session-view.js';
import { SetPassphrase } from './set-passphrase.js';
import { StaffController } from './staff.controller.js';
import { Staff } from './staff.js';
import { StaffLog } from './staff-log.js';
import { StaffLogEntry } from './staff-log-entry.model.js';
import { SweepSessions } from './sweep-sessions.js';

@Module({
  imports: [
    PassportModule.register({ session: true }),
    SequelizeModule.forFeature([Person, SessionRecord, OneTimeToken, StaffLogEntry, PrinterCardRecord]),
  ],
  controllers: [SessionController, AccountController, PrintersController, StaffController],
  providers: [
    People,
    PeopleParts,
    AddressVerifiedSteps,
    Passphrases,
    OneTimeTokens,
    AccountLinks,
    OwnSessions,
    LocalStrategy,
    SessionSerializer,
    SessionView,
    Join,
    MailedLinks,
    SetPassphrase,
    Staff,
    StaffLog,
    SweepSessions,
    PrinterCards,
    ChangePrinterCards,
  ],
  exports: [PeopleParts, People, AddressVerifiedSteps, StaffLog, PrinterCards],
})
export class AccountsModule {}
