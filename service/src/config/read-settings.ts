import * as path from 'node:path';
import { z } from 'zod';
import { toStandardOutput } from '../http/json-log';
import { demoSecret } from './demo-secret';
import { Settings } from './settings';

const SERVICE_DIR = path.resolve(__dirname, '../..');
const SECRET_MIN_BYTES = 32;

const port = z.coerce.number().int().min(0).max(65535);
const text = z.string().trim().min(1);
const onOff = z.enum(['1', '0', 'on', 'off', 'true', 'false']);

const environment = z.object({
  PORT: port.default(3000),
  NODE_ENV: text.optional(),
  SILTLIGHT_DATA_DIR: text.default(path.join(SERVICE_DIR, 'data')),
  SILTLIGHT_DEMO: onOff.optional(),
  SILTLIGHT_DEMO_PASSWORD: z.string().min(15).max(128).optional(),
  SILTLIGHT_SECRET: z
    .string()
    .refine((secret) => Buffer.byteLength(secret) >= SECRET_MIN_BYTES)
    .optional(),
  SILTLIGHT_PUBLIC_URL: z.url({ protocol: /^https?$/ }).optional(),
  SILTLIGHT_SMTP_HOST: text.optional(),
  SILTLIGHT_SMTP_PORT: port.default(587),
  SILTLIGHT_SMTP_USER: text.optional(),
  SILTLIGHT_SMTP_PASSWORD: text.optional(),
  SILTLIGHT_SMTP_FROM: text.default('Siltlight <siltlight@localhost>'),
  SILTLIGHT_MAIL_FAKE_PORT: port.default(0),
});

type Variable = keyof z.infer<typeof environment>;

const REMEDIES: Record<Variable, string> = {
  PORT: 'Give a whole number from 0 to 65535, or leave it out for 3000.',
  NODE_ENV: 'Leave it out, or set it to production.',
  SILTLIGHT_DATA_DIR: 'Give the path of a folder that the service may write to, or leave it out.',
  SILTLIGHT_DEMO: 'Give 1, on or true to show the demo, 0, off or false to leave it out.',
  SILTLIGHT_DEMO_PASSWORD: 'Give 15 to 128 characters, or leave it out and one is made.',
  SILTLIGHT_SECRET: `Give at least ${SECRET_MIN_BYTES} bytes of randomness, for example from: openssl rand -hex 32`,
  SILTLIGHT_PUBLIC_URL: 'Give the http or https address at which people reach the service.',
  SILTLIGHT_SMTP_HOST: 'Give the name of the mail server, or leave it out.',
  SILTLIGHT_SMTP_PORT: 'Give a whole number from 0 to 65535, or leave it out for 587.',
  SILTLIGHT_SMTP_USER: 'Give the mail account, or leave it out.',
  SILTLIGHT_SMTP_PASSWORD: 'Give the password of the mail account, or leave it out.',
  SILTLIGHT_SMTP_FROM: 'Give the sender, for example: Siltlight <desk@example.org>',
  SILTLIGHT_MAIL_FAKE_PORT: 'Give a whole number from 0 to 65535, or leave it out for a free port.',
};

/** A variable that keeps the service from starting; the message names it, its value and what to do. */
export class SettingsError extends Error {}

/**
 * @throws SettingsError when a variable has an impossible value, or the secret is missing outside demo mode
 */
export function readSettings(variables: Record<string, string | undefined>): Settings {
  const given = Object.fromEntries(Object.entries(variables).filter(([, value]) => value !== ''));
  const read = environment.safeParse(given);
  if (!read.success) throw new SettingsError(explain(read.error, given));
  const values = read.data;
  const production = values.NODE_ENV === 'production';
  const demo = values.SILTLIGHT_DEMO ? ['1', 'on', 'true'].includes(values.SILTLIGHT_DEMO) : !production;
  const dataDir = path.resolve(values.SILTLIGHT_DATA_DIR);
  return new Settings({
    port: values.PORT,
    dataDir,
    demo,
    production,
    demoPassword: values.SILTLIGHT_DEMO_PASSWORD,
    secret: values.SILTLIGHT_SECRET ?? secretWithoutVariable(demo, dataDir),
    publicUrl: (values.SILTLIGHT_PUBLIC_URL ?? `http://127.0.0.1:${values.PORT}`).replace(/\/+$/, ''),
    smtp: values.SILTLIGHT_SMTP_HOST
      ? {
          host: values.SILTLIGHT_SMTP_HOST,
          port: values.SILTLIGHT_SMTP_PORT,
          user: values.SILTLIGHT_SMTP_USER,
          password: values.SILTLIGHT_SMTP_PASSWORD,
        }
      : undefined,
    mailFrom: values.SILTLIGHT_SMTP_FROM,
    mailFakePort: values.SILTLIGHT_MAIL_FAKE_PORT,
    uiDir: path.resolve(SERVICE_DIR, '../ui/dist'),
    log: toStandardOutput,
  });
}

function secretWithoutVariable(demo: boolean, dataDir: string): string {
  if (demo) return demoSecret(dataDir);
  throw new SettingsError(
    `SILTLIGHT_SECRET is not set and demo mode is off. ${REMEDIES.SILTLIGHT_SECRET} (or set SILTLIGHT_DEMO=1 to try the demo).`,
  );
}

function explain(error: z.ZodError, given: Record<string, string | undefined>): string {
  return error.issues
    .map((issue) => {
      const variable = issue.path[0] as Variable;
      const isSecret = /SECRET|PASSWORD/.test(variable);
      const value = given[variable] ?? '';
      const shown = isSecret ? `a text of ${Buffer.byteLength(value)} bytes` : JSON.stringify(value);
      return `${variable} is ${shown}, which cannot be used. ${REMEDIES[variable]}`;
    })
    .join('\n');
}
