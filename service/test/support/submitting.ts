import * as fs from 'node:fs';
import * as path from 'node:path';
import type { FindingView, SubmissionDetail } from '@siltlight/common/wire/submissions';
import type { Test } from 'supertest';
import { answers } from './form';
import type { SignedInCaller } from './sign-in';

export const SUBMISSIONS = '/api/v1/submissions';

const samplesDir = path.join(__dirname, '../../../reference/samples');

/** A file of reference/samples: real open data as people mail it. */
export const sampleFile = (name: string): Buffer => fs.readFileSync(path.join(samplesDir, name));

export const REAL_WORKBOOK = 'A_EDC_NGRIP_dust_v3_final.xlsx';
export const REAL_EXPORT = 'B_Staubfluesse_Export.csv';

export interface ExpectedRow {
  site: string;
  latitudeDeg: number;
  longitudeDeg: number;
  ageKaBp: number;
  fluxGM2Yr: number;
  /** null where the file states none */
  fluxSigmaGM2Yr: number | null;
}

/** The rows that should come out of a sample file, as the README beside it gives them. */
export function expectedRows(name: 'A_expected.csv' | 'B_expected.csv'): ExpectedRow[] {
  const [, ...lines] = sampleFile(name).toString('utf8').trim().split(/\r?\n/);
  return lines.map((line) => {
    const [site = '', lat, lon, age, flux, sigma] = line.split(',');
    return {
      site,
      latitudeDeg: Number(lat),
      longitudeDeg: Number(lon),
      ageKaBp: Number(age),
      fluxGM2Yr: Number(flux),
      fluxSigmaGM2Yr: sigma ? Number(sigma) : null,
    };
  });
}

/** Tolerances of the README: days a year may be 365, 365.2425 or 365.25; ages agree exactly but for rounding. */
export function expectRows(found: ExpectedRow[], expected: ExpectedRow[]): void {
  expect(found.length).toBe(expected.length);
  expected.forEach((row, index) => {
    const got = found[index]!;
    expect({ index, site: got.site }).toEqual({ index, site: row.site });
    expect(Math.abs(got.latitudeDeg - row.latitudeDeg)).toBeLessThan(1e-9);
    expect(Math.abs(got.longitudeDeg - row.longitudeDeg)).toBeLessThan(1e-9);
    expect(Math.abs(got.ageKaBp - row.ageKaBp)).toBeLessThanOrEqual(1e-6);
    expect(Math.abs(got.fluxGM2Yr / row.fluxGM2Yr - 1)).toBeLessThanOrEqual(0.002);
    if (row.fluxSigmaGM2Yr === null) expect(got.fluxSigmaGM2Yr).toBeNull();
    else expect(Math.abs(got.fluxSigmaGM2Yr! / row.fluxSigmaGM2Yr - 1)).toBeLessThanOrEqual(0.002);
  });
}

export const upload = (
  caller: SignedInCaller,
  content: Buffer | string,
  fileName: string,
  fields: Record<string, string> = {},
): Test => {
  const call = caller.post(SUBMISSIONS).attach('file', Buffer.from(content as string), fileName);
  return Object.entries(fields).reduce((test, [name, value]) => test.field(name, value), call);
};

export async function uploaded(
  caller: SignedInCaller,
  content: Buffer | string,
  fileName: string,
  fields: Record<string, string> = {},
): Promise<SubmissionDetail> {
  return (await upload(caller, content, fileName, fields).expect(201)).body as SubmissionDetail;
}

/** Acts on a submission one after the other, with the revision that the last answer gave. */
export class Steps {
  constructor(public detail: SubmissionDetail) {}

  get path(): string {
    return `${SUBMISSIONS}/${this.detail.id}`;
  }

  get tag(): string {
    return `"${this.detail.revision}"`;
  }

  call(caller: SignedInCaller, act: string, body?: object): Test {
    return caller.post(`${this.path}/${act}`, body).set('If-Match', this.tag);
  }

  async post(caller: SignedInCaller, act: string, body?: object): Promise<SubmissionDetail> {
    return this.took(await this.call(caller, act, body).expect(200));
  }

  async put(caller: SignedInCaller, what: string, body: object): Promise<SubmissionDetail> {
    const call = caller.put(`${this.path}/${what}`, body).set('If-Match', this.tag);
    return this.took(await call.expect(200));
  }

  async reload(caller: SignedInCaller): Promise<SubmissionDetail> {
    return this.took(await caller.get(this.path).expect(200));
  }

  async findings(caller: SignedInCaller, query = 'limit=1000'): Promise<FindingView[]> {
    return (await caller.get(`${this.path}/findings?${query}`).expect(200)).body.items as FindingView[];
  }

  /** Waives every open warning, as a steward who has looked at each. */
  async waiveAll(steward: SignedInCaller): Promise<void> {
    const warnings = (await this.findings(steward, 'severity=warning&limit=1000')).filter(
      ({ waived }) => !waived,
    );
    if (warnings.length === 0) return;
    const findingKeys = warnings.map(({ key }) => key);
    await this.post(steward, 'waivers', { findingKeys, reason: 'Looked at, one by one.' });
  }

  private took(answer: { body: unknown }): SubmissionDetail {
    this.detail = answer.body as SubmissionDetail;
    return this.detail;
  }
}

/** Two samples that no rule objects to but for remarks: small, so that many can be made. */
export const SMALL_TABLE =
  'Site,Latitude,Longitude,Age,Age error,Dust flux,Flux error (1 sigma),Size cut-off\n' +
  ',degrees N,degrees E,ka BP,ka,g m-2 yr-1,g m-2 yr-1,\n' +
  'Core KX-1,-41.27,172.64,1.2,0.05,0.42,0.04,bulk\n' +
  'Core KX-1,-41.27,172.64,20.4,0.2,1.31,0.12,bulk\n';

/** Uploaded, with the form filled in. */
export async function described(
  caller: SignedInCaller,
  content: Buffer | string = SMALL_TABLE,
  fileName = 'small.csv',
  form: object = answers,
): Promise<Steps> {
  const steps = new Steps(await uploaded(caller, content, fileName));
  await steps.put(caller, 'metadata', form);
  return steps;
}

export async function handedIn(
  caller: SignedInCaller,
  content: Buffer | string = SMALL_TABLE,
  fileName = 'small.csv',
  form: object = answers,
): Promise<Steps> {
  const steps = await described(caller, content, fileName, form);
  await steps.post(caller, 'submit');
  return steps;
}

export async function approved(
  contributor: SignedInCaller,
  steward: SignedInCaller,
  content: Buffer | string = SMALL_TABLE,
  fileName = 'small.csv',
  decision: object = {},
  form: object = answers,
): Promise<Steps> {
  const steps = await handedIn(contributor, content, fileName, form);
  await steps.waiveAll(steward);
  await steps.post(steward, 'decision', { decision: 'approve', ...decision });
  return steps;
}
