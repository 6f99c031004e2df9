import * as fs from 'node:fs';
import * as path from 'node:path';
import type { SubmissionDetail } from '@siltlight/common/wire/submissions';
import type { Test } from 'supertest';
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
