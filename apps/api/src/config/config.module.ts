import { Global, Module } from '@nestjs/common';
import { CONFIG } from './config.js';
import { readEnvironment } from './environment.js';

@Global()
@Module({
  providers: [{ provide: CONFIG, useFactory: () => readEnvironment(process.env) }],
  exports: [CONFIG],
})
export class ConfigModule {}
