import { Injectable, type OnModuleInit } from '@nestjs/common';
import { DiscoveryService, Reflector } from '@nestjs/core';
import { definedJobs, HANDLES_JOB, type JobDefinition, type JobHandler } from './job.js';

/** Finds the handlers; refuses to boot where a kind of job has none or two. */
@Injectable()
export class JobRegistry implements OnModuleInit {
  private readonly handlers = new Map<string, { definition: JobDefinition; handler: JobHandler }>();

  constructor(
    private readonly discovery: DiscoveryService,
    private readonly reflector: Reflector,
  ) {}

  onModuleInit(): void {
    for (const { instance, metatype } of this.discovery.getProviders()) {
      if (!instance || typeof metatype !== 'function') continue;
      const definition = this.reflector.get<JobDefinition | undefined>(HANDLES_JOB, metatype);
      if (!definition) continue;
      if (this.handlers.has(definition.name))
        throw new Error(`Two handlers want the job ${definition.name}; keep one.`);
      this.handlers.set(definition.name, { definition, handler: instance as JobHandler });
    }
    const missing = definedJobs().filter(({ name }) => !this.handlers.has(name));
    if (missing.length > 0)
      throw new Error(
        `No handler for the job ${missing.map(({ name }) => name).join(', ')}; provide one in its room's module.`,
      );
  }

  find(name: string): { definition: JobDefinition; handler: JobHandler } | undefined {
    return this.handlers.get(name);
  }
}
