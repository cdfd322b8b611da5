import { Module } from '@nestjs/common';
import { SequelizeModule } from '@nestjs/sequelize';
import { AccountsModule } from '../accounts/accounts.module.js';
import { CatalogueModule } from '../catalogue/catalogue.module.js';
import { FollowPlan } from './plans/follow-plan.js';
import { PlanKits } from './plans/plan-kits.js';
import { PlansController } from './plans/plans.controller.js';
import { PlansView } from './plans/plans-view.js';
import { PledgePlanKit } from './plans/pledge-plan-kit.model.js';
import { PledgePlan } from './plans/pledge-plan.model.js';
import { SavePlan } from './plans/save-plan.js';
import { AskService } from './pledges/ask-service.js';
import { ChangeCard } from './pledges/change-card.js';
import { ChangePledge } from './pledges/change-pledge.js';
import { FollowPledge } from './pledges/follow-pledge.js';
import { GiveRights } from './pledges/give-rights.js';
import { GiveUpPledge } from './pledges/give-up-pledge.js';
import { LookAtPledge } from './pledges/look-at-pledge.js';
import { LookAfterPledge, LookOnce } from './pledges/look-jobs.js';
import { OpenPledge } from './pledges/open-pledge.js';
import { OwnPledges } from './pledges/own-pledges.js';
import { PlacePledge } from './pledges/place-pledge.js';
import { PledgeEvents } from './pledges/pledge-events.js';
import { PledgeHistory } from './pledges/pledge-history.js';
import { PledgeMails } from './pledges/pledge-mails.js';
import { PledgePayment } from './pledges/pledge-payment.model.js';
import { PledgePaidSteps, PledgeRightsSteps } from './pledges/pledge-steps.js';
import { PledgeView } from './pledges/pledge-view.js';
import { Pledge } from './pledges/pledge.model.js';
import { PledgesController } from './pledges/pledges.controller.js';
import { RecordPayment } from './pledges/record-payment.js';
import { RefreshPledge } from './pledges/refresh-pledge.js';
import { Supporters } from './supporters.js';
import { ListSupporters } from './workshop/list-supporters.js';
import { ShowSupporter } from './workshop/show-supporter.js';
import { SupporterFigures } from './workshop/supporter-figures.js';
import { SupportersController } from './workshop/supporters.controller.js';

@Module({
  imports: [
    AccountsModule,
    CatalogueModule,
    SequelizeModule.forFeature([PledgePlan, PledgePlanKit, Pledge, PledgePayment]),
  ],
  controllers: [PlansController, PledgesController, SupportersController],
  providers: [
    PlanKits,
    PlansView,
    SavePlan,
    FollowPlan,
    PlacePledge,
    OpenPledge,
    GiveUpPledge,
    AskService,
    LookAtPledge,
    FollowPledge,
    RecordPayment,
    GiveRights,
    PledgePaidSteps,
    PledgeRightsSteps,
    PledgeMails,
    PledgeHistory,
    LookOnce,
    LookAfterPledge,
    PledgeEvents,
    OwnPledges,
    PledgeView,
    RefreshPledge,
    ChangePledge,
    ChangeCard,
    ListSupporters,
    SupporterFigures,
    ShowSupporter,
    Supporters,
  ],
  exports: [Supporters, PledgePaidSteps, PledgeRightsSteps],
})
export class SupportersModule {}
