import * as fs from 'node:fs/promises';
import * as os from 'node:os';
import * as path from 'node:path';
import type { NestExpressApplication } from '@nestjs/platform-express';
import request from 'supertest';
import { createApp } from '../../src/app';
import { readSettings } from '../../src/config/read-settings';
import type { Settings } from '../../src/config/settings';
import { SeedRegistry } from '../../src/database/seed-registry';
import type { LogLine } from '../../src/http/json-log';
import { copySeededData } from './seeded-data';

export interface TestApp {
  app: NestExpressApplication;
  settings: Settings;
  /** keeps cookies from call to call, as a browser does */
  http: ReturnType<typeof request.agent>;
  /** everything that the service has logged */
  logged: LogLine[];
  /** a further, signed-out caller */
  stranger: () => ReturnType<typeof request.agent>;
  close: () => Promise<void>;
}

export interface TestAppOptions {
  /** runs the demo seed before the first request */
  seeded?: boolean;
  /** variables of the environment, e.g. SILTLIGHT_DEMO */
  variables?: Record<string, string>;
  /** changes to the settings that no variable reaches, e.g. uiDir */
  settings?: Partial<Settings>;
  /** keep the data of an earlier app: its folder is not removed on close */
  dataDir?: string;
}

/** The real service on a data folder of its own, listening on no port but supertest's. */
export async function testApp(options: TestAppOptions = {}): Promise<TestApp> {
  const dataDir = options.dataDir ?? (await fs.mkdtemp(path.join(os.tmpdir(), 'siltlight-test-')));
  const logged: LogLine[] = [];
  const settings = readSettings({
    SILTLIGHT_DATA_DIR: dataDir,
    SILTLIGHT_DEMO: '1',
    SILTLIGHT_DEMO_PASSWORD: 'a password for the tests',
    ...options.variables,
  });
  Object.assign(settings, { log: (line: LogLine) => logged.push(line) }, options.settings);
  const usual = !options.variables && !options.settings && !options.dataDir;
  if (options.seeded && usual) await copySeededData(dataDir, seed);
  const app = await createApp(settings);
  if (options.seeded) await app.get(SeedRegistry).run();
  const server = app.getHttpServer() as Parameters<typeof request.agent>[0];
  return {
    app,
    settings,
    http: request.agent(server),
    logged,
    stranger: () => request.agent(server),
    close: async () => {
      await app.close();
      if (!options.dataDir) await fs.rm(dataDir, { recursive: true, force: true });
    },
  };
}

async function seed(dataDir: string): Promise<void> {
  await fs.mkdir(dataDir);
  const service = await testApp({ seeded: true, dataDir });
  await service.close();
}
