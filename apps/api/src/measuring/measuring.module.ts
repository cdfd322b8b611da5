import { existsSync } from 'node:fs';
import { Module } from '@nestjs/common';
import { CatalogueModule } from '../catalogue/catalogue.module.js';
import { CONFIG, type Config } from '../config/config.js';
import { CompareMeshes } from './compare-meshes.js';
import { InlineMeshRunner } from './inline-mesh-runner.js';
import { EstimatePrint } from './estimate-print.js';
import { MeasureFile } from './measure-file.js';
import { MeshRunner } from './mesh-runner.js';
import { RenewMeasurement } from './renew-measurement.js';
import { StoredMeshes } from './stored-meshes.js';
import { ThreadMeshRunner } from './thread-mesh-runner.js';

const TIMEOUT_MS = 10 * 60_000;
const MAX_HEAP_MB = 2048;

@Module({
  imports: [CatalogueModule],
  providers: [
    StoredMeshes,
    MeasureFile,
    RenewMeasurement,
    CompareMeshes,
    EstimatePrint,
    {
      provide: MeshRunner,
      inject: [CONFIG],
      useFactory: (config: Config): MeshRunner => {
        const worker = new URL('./measure-worker.js', import.meta.url);
        return existsSync(worker)
          ? new ThreadMeshRunner({
              worker,
              threads: config.MEASURING_THREADS,
              timeoutMs: TIMEOUT_MS,
              maxHeapMb: MAX_HEAP_MB,
            })
          : new InlineMeshRunner();
      },
    },
  ],
})
export class MeasuringModule {}
