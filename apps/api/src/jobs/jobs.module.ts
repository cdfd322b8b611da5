import { Global, Module } from '@nestjs/common';
import { DiscoveryModule } from '@nestjs/core';
import { JobBell } from './job-bell.js';
import { JobQueue } from './job-queue.js';
import { JobRegistry } from './job-registry.js';
import { JobWorker } from './job-worker.js';

@Global()
@Module({
  imports: [DiscoveryModule],
  providers: [JobBell, JobQueue, JobRegistry, JobWorker],
  exports: [JobQueue, JobWorker],
})
export class JobsModule {}
