import { Injectable } from '@nestjs/common';
import type { z } from 'zod';
import { keyOf, Storage } from '../adapters/storage/storage.js';
import { compareMeshes } from '../catalogue/comparison/compare-meshes.job.js';
import { MeshComparisons } from '../catalogue/comparison/mesh-comparisons.js';
import { HandlesJob, TryLater, type JobHandler } from '../jobs/job.js';
import { withLocalPaths } from './local-copy.js';
import { MeshRunner } from './mesh-runner.js';

/** After so many runs that ended without an answer two files count as a pair that ends the process. */
const MOST_TRIES = 4;
/** Two meshes and the index over their surfaces took 1 GB at six million triangles together. */
const MOST_TRIANGLES = 8_000_000;

/** Compares two stored meshes of a part and keeps what came of it. */
@Injectable()
@HandlesJob(compareMeshes)
export class CompareMeshes implements JobHandler<typeof compareMeshes.payload> {
  constructor(
    private readonly comparisons: MeshComparisons,
    private readonly storage: Storage,
    private readonly runner: MeshRunner,
  ) {}

  async handle(pair: z.output<typeof compareMeshes.payload>): Promise<void> {
    // Comparing takes its time; measuring and the mails to buyers go first.
    if (this.runner.isCrowded) throw new TryLater(1);
    const work = await this.comparisons.begin(pair);
    if (!work) return;
    if (work.tries > MOST_TRIES)
      return this.comparisons.keepFailed(
        pair,
        'worker-ended',
        `comparing the two files did not come to an end in ${MOST_TRIES} tries.`,
      );
    if (work.triangles > MOST_TRIANGLES)
      return this.comparisons.keepFailed(
        pair,
        'too-many-triangles',
        `the two files have ${inMillions(work.triangles)} triangles together, more than the ${inMillions(MOST_TRIANGLES)} that can be compared.`,
      );
    const keys = [keyOf('files', pair.beforeSha), keyOf('files', pair.afterSha)];
    const outcome = await withLocalPaths(this.storage, keys, ([beforePath = '', afterPath = '']) =>
      this.runner.compare({ beforePath, afterPath }),
    );
    return outcome.isCompared
      ? this.comparisons.keepCompared(pair, outcome.result)
      : this.comparisons.keepFailed(pair, outcome.code, outcome.fault);
  }
}

const inMillions = (count: number): string => `${Number((count / 1e6).toFixed(1))} million`;
