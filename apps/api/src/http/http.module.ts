import { Global, Module } from '@nestjs/common';
import { APP_FILTER, APP_GUARD, APP_INTERCEPTOR } from '@nestjs/core';
import { AccessGuard } from './access.guard.js';
import { AnswerShapeInterceptor } from './answer-shape.interceptor.js';
import { HealthController } from './health.controller.js';
import { PageHeads } from './page-heads.js';
import { ProblemFilter } from './problem.filter.js';
import { RateLimits } from './rate-limits.js';
import { SameSiteGuard } from './same-site.guard.js';

@Global()
@Module({
  controllers: [HealthController],
  providers: [
    RateLimits,
    PageHeads,
    { provide: APP_FILTER, useClass: ProblemFilter },
    { provide: APP_GUARD, useClass: SameSiteGuard },
    { provide: APP_GUARD, useClass: AccessGuard },
    { provide: APP_INTERCEPTOR, useClass: AnswerShapeInterceptor },
  ],
  exports: [RateLimits, PageHeads],
})
export class HttpModule {}
