import { Inject } from '@nestjs/common';
import type { Environment } from './environment.js';

export const CONFIG = Symbol('config');
/** The frozen settings, read once at start-up. */
export type Config = Environment;
export const InjectConfig = (): ParameterDecorator => Inject(CONFIG) as ParameterDecorator;
