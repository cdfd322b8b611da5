import { SetMetadata, type CustomDecorator } from '@nestjs/common';
import type { z } from 'zod';
import type { Tx } from '../database/transactions.js';

export interface JobDefinition<P extends z.ZodType = z.ZodType> {
  readonly name: string;
  readonly payload: P;
  /** After so many failed tries the job is dead and shown to the workshop. */
  readonly attempts: number;
  /** Seconds before try `n` (counted from 1) after a failure. */
  readonly retryAfterSeconds: (failures: number) => number;
}

const definitions = new Map<string, JobDefinition>();

/** Declares a kind of job. Boot refuses a kind without a handler. */
export const defineJob = <P extends z.ZodType>(
  options: Pick<JobDefinition<P>, 'name' | 'payload'> & Partial<JobDefinition<P>>,
): JobDefinition<P> => {
  const definition = {
    attempts: 12,
    retryAfterSeconds: (failures: number) => Math.min(2 ** failures, 900),
    ...options,
  };
  definitions.set(definition.name, definition);
  return definition;
};

export const definedJobs = (): readonly JobDefinition[] => [...definitions.values()];

/**
 * What a handler may give back: work for the very transaction that marks the job done, so that the
 * effect and the mark stand or fall together.
 */
export type Finish = (tx: Tx) => Promise<void>;

/** Runs again later, without counting as a failure. */
export class TryLater extends Error {
  constructor(readonly seconds: number) {
    super(`again in ${seconds} s`);
  }
}

export interface JobHandler<P extends z.ZodType = z.ZodType> {
  /** May run more than once for one job, also at the same time after a lease ran out: be idempotent. */
  handle(payload: z.output<P>): Promise<Finish | void>;
}

export const HANDLES_JOB = Symbol('handles-job');
/** Marks a provider as the one handler of a kind of job. */
export const HandlesJob = (definition: JobDefinition): CustomDecorator<symbol> =>
  SetMetadata(HANDLES_JOB, definition);
