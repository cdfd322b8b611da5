import { NestFactory } from '@nestjs/core';
import type { NestExpressApplication } from '@nestjs/platform-express';
import { getConnectionToken } from '@nestjs/sequelize';
import { SwaggerModule } from '@nestjs/swagger';
import compression from 'compression';
import passport from 'passport';
import type { Sequelize } from 'sequelize';
import { sessions } from './accounts/session-middleware.js';
import { AppModule } from './app.module.js';
import { CONFIG, type Config } from './config/config.js';
import { migrate } from './database/migrate.js';
import { describeApi } from './http/openapi.js';
import { PageHeads } from './http/page-heads.js';
import { createLogger, nestLogger, requestLog } from './http/request-log.js';
import { securityHeaders } from './http/security-headers.js';
import { serveWeb } from './http/web-files.js';

const options = (level: string): { logger: ReturnType<typeof createLogger>; nest: object } => {
  const logger = createLogger(level);
  return { logger, nest: { rawBody: true, logger: nestLogger(logger), abortOnError: false } };
};

/** Migrates, and puts on everything that is not a room: logs, headers, body reading, description, pages. */
export const furnishApp = async (
  app: NestExpressApplication,
  logger = createLogger('silent'),
): Promise<NestExpressApplication> => {
  const config = app.get<Config>(CONFIG);
  const database = app.get<Sequelize>(getConnectionToken());
  await migrate(database);
  app.set('trust proxy', config.TRUST_PROXY);
  app.disable('x-powered-by');
  app.use(requestLog(logger));
  app.use(securityHeaders(config.BASE_URL));
  // Files go out as they are: compressing them would break ranges and hashes.
  app.use(
    compression({
      filter: (request, response) =>
        !request.path.startsWith('/api/files/') && compression.filter(request, response),
    }),
  );
  app.useBodyParser('json', { limit: '1mb' });
  app.use('/api', ...sessions(config, database), passport.initialize(), passport.session());
  app.setGlobalPrefix('api');
  SwaggerModule.setup('api/docs', app, () => describeApi(config.WORKSHOP_NAME), {
    jsonDocumentUrl: 'api/docs/openapi.json',
    raw: ['json'],
  });
  await app.init();
  const heads = app.get(PageHeads);
  serveWeb(app, config.WEB_DIST, (path) => heads.headFor(path));
  return app;
};

/** The whole application, migrated and ready to listen. */
export const createApp = async (): Promise<NestExpressApplication> => {
  const { logger, nest } = options(process.env['LOG_LEVEL'] ?? 'info');
  return furnishApp(await NestFactory.create<NestExpressApplication>(AppModule, nest), logger);
};
