import { Module } from '@nestjs/common';
import { SequelizeModule } from '@nestjs/sequelize';
import { AccountsModule } from '../accounts/accounts.module.js';
import { CatalogueModule } from '../catalogue/catalogue.module.js';
import { EntitlementsModule } from '../entitlements/entitlements.module.js';
import { AnswerFit } from './answer-fit.js';
import { FitAnswer } from './fit-answer.model.js';
import { FitMails } from './fit-mails.js';
import { FitMatrices } from './fit-matrix.js';
import { FitPicture } from './fit-picture.js';
import { FitReport } from './fit-report.model.js';
import { FitController } from './fit.controller.js';
import { ListFitReports } from './list-fit-reports.js';
import { ReporterParts } from './reporter-parts.js';
import { ReportFit } from './report-fit.js';
import { ShowFitReport } from './show-fit-report.js';
import { WorkshopFitController } from './workshop-fit.controller.js';

@Module({
  imports: [
    AccountsModule,
    CatalogueModule,
    EntitlementsModule,
    SequelizeModule.forFeature([FitReport, FitAnswer]),
  ],
  controllers: [FitController, WorkshopFitController],
  providers: [ReportFit, ShowFitReport, ListFitReports, FitMatrices, FitPicture, FitMails, AnswerFit, ReporterParts],
  exports: [ListFitReports, ReporterParts],
})
export class FitModule {}
