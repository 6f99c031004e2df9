import * as path from 'node:path';
import type { LogSink } from '../http/json-log';

export interface SmtpSettings {
  host: string;
  port: number;
  user: string | undefined;
  password: string | undefined;
}

/** Everything the service is told from outside, checked once at the start. Injected by class. */
export class Settings {
  port: number;
  dataDir: string;
  demo: boolean;
  production: boolean;
  /** password of every demo account; generated and printed when the environment names none */
  demoPassword: string | undefined;
  /** signs tokens and cookies; at least 32 bytes */
  secret: string;
  /** address in mails; never taken from a request's Host header */
  publicUrl: string;
  /** undefined: mail goes to the loopback fake in demo mode, and waits in the outbox otherwise */
  smtp: SmtpSettings | undefined;
  mailFrom: string;
  /** port of the loopback mail fake; 0 takes a free one */
  mailFakePort: number;
  uiDir: string;
  log: LogSink;

  constructor(values: Required<Omit<Settings, 'databaseFile' | 'filesDir' | 'temporaryDir' | 'backupsDir'>>) {
    Object.assign(this, values);
  }

  get databaseFile(): string {
    return path.join(this.dataDir, 'siltlight.sqlite');
  }
  get filesDir(): string {
    return path.join(this.dataDir, 'files');
  }
  /** uploads and half-written exports; swept at every start */
  get temporaryDir(): string {
    return path.join(this.dataDir, 'temporary');
  }
  get backupsDir(): string {
    return path.join(this.dataDir, 'backups');
  }
}
