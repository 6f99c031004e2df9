import 'reflect-metadata';
import * as fs from 'node:fs';
import { NestFactory } from '@nestjs/core';
import type { NestExpressApplication } from '@nestjs/platform-express';
import cookieParser from 'cookie-parser';
import type { Express } from 'express';
import { AppModule } from './app.module';
import type { Settings } from './config/settings';
import { migrate } from './database/migrator';
import { clientAssets, clientFiles, clientPage } from './http/client-pages';
import { jsonBody } from './http/json-body';
import { JsonLog } from './http/json-log';
import { openApiDocument } from './http/openapi';
import { ProblemFilter } from './http/problem.filter';
import { requestLog } from './http/request-log';
import { securityHeaders } from './http/security-headers';

/** Addresses of the interface are `/api/v1/…`; a controller names only what comes after. */
export const API_PREFIX = 'api/v1';
export const OPENAPI_PATH = '/api/openapi.json';

/** The whole service, migrated and ready to listen: the same for the running program and for its tests. */
export async function createApp(settings: Settings): Promise<NestExpressApplication> {
  for (const folder of [settings.dataDir, settings.filesDir, settings.temporaryDir]) {
    fs.mkdirSync(folder, { recursive: true });
  }
  await migrate(settings.databaseFile, settings.backupsDir);
  const app = await NestFactory.create<NestExpressApplication>(AppModule.forRoot(settings), {
    bodyParser: false,
    logger: new JsonLog(settings.log),
    abortOnError: false,
  });
  app.disable('x-powered-by');
  // Weak tags over whole answers would cost a hash each; what can be kept sets its own strong tag.
  app.disable('etag');
  app.setGlobalPrefix(API_PREFIX, { exclude: ['api/health/{*rest}'] });
  useMiddleware(app, settings);
  app.useGlobalFilters(new ProblemFilter(settings));
  const document = openApiDocument(app);
  const express: Express = app.getHttpAdapter().getInstance();
  express.get(OPENAPI_PATH, (_request, response) => void response.json(document));
  await app.init();
  return app;
}

function useMiddleware(app: NestExpressApplication, settings: Settings): void {
  app.use(requestLog(settings.log));
  app.use(securityHeaders(settings.publicUrl));
  app.use(cookieParser());
  app.use(jsonBody);
  app.use('/assets', clientAssets(settings.uiDir));
  app.use(clientPage(settings.uiDir));
  app.use(clientFiles(settings.uiDir));
}
