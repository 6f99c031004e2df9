import { readCsv, type CsvRow } from '../../reference/read';
import { testAppWithPeople } from './support/demo-people';
import { signedInAs, type SignedInCaller } from './support/sign-in';
import type { TestApp } from './support/test-app';

const CALCULATORS = '/api/v1/calculators';

let service: TestApp;
let modeller: SignedInCaller;
beforeAll(async () => {
  service = await testAppWithPeople();
  modeller = await signedInAs(service, 'modeller');
});
afterAll(() => service.close());

async function answerOf(name: string, body: object): Promise<Record<string, number>> {
  const answer = await modeller.post(`${CALCULATORS}/${name}`, body).expect(200);
  expect(answer.body.cautions).toEqual(expect.any(Array));
  expect(answer.body.method).toEqual({ name: expect.any(String), source: expect.any(String) });
  return answer.body;
}

/** Some rows of a table of reference/checks, from its beginning to its end. */
function rowsOf(table: string, count = 12): CsvRow[] {
  const rows = readCsv(`checks/${table}`);
  const step = Math.max(1, Math.floor(rows.length / count));
  return rows.filter((_, index) => index % step === 0);
}
const number = (row: CsvRow, column: string): number => {
  const value = Number(row[column]);
  if (row[column] === '' || !Number.isFinite(value)) throw new Error(`${column} is ${row[column]}`);
  return value;
};

/** Twelve significant figures are printed in most of the tables, ten in some. */
function expectNear(value: number, expected: number, tolerance = 1e-9, floor = 1): void {
  expect(Math.abs(value - expected)).toBeLessThanOrEqual(tolerance * Math.max(Math.abs(expected), floor));
}

test('orbit: elements of the independent table', async () => {
  for (const row of rowsOf('orbit/berger1978_elements.csv')) {
    const answer = await answerOf('orbit', {
      ageKaBp: number(row, 'age_ka_before_1950'),
      solution: 'berger1978',
    });
    expectNear(answer.eccentricity!, number(row, 'eccentricity'));
    expectNear(answer.obliquityDeg!, number(row, 'obliquity_deg'));
    expectNear(answer.perihelionLongitudeDeg!, number(row, 'longitude_of_perihelion_deg'));
    expectNear(answer.climaticPrecession!, number(row, 'climatic_precession_e_sin_omega'));
  }
});

test('insolation: daily means, day lengths and zenith cosines of the independent table', async () => {
  for (const row of rowsOf('orbit/daily_insolation.csv', 20)) {
    const answer = await answerOf('insolation', {
      orbit: {
        eccentricity: number(row, 'eccentricity'),
        obliquityDeg: number(row, 'obliquity_deg'),
        perihelionLongitudeDeg: number(row, 'longitude_of_perihelion_deg'),
      },
      latitudeDeg: number(row, 'latitude_deg'),
      solarLongitudeDeg: number(row, 'true_solar_longitude_deg'),
      solarConstantWm2: 1361,
    });
    expectNear(answer.dailyMeanWm2!, number(row, 'insolation_W_m2_S0_1361'), 1e-8);
    expectNear(answer.dayLengthHours!, number(row, 'day_length_h'), 1e-8);
    expectNear(answer.meanCosZenithDaylight!, number(row, 'mean_cos_zenith_daylight'), 1e-8);
  }
});

test('forcing: the thin layer of the independent table, and each method names its source', async () => {
  for (const row of rowsOf('optics/forcing_thin_layer.csv')) {
    const answer = await answerOf('forcing', {
      method: 'thin-layer',
      solarConstantWm2: number(row, 'S0_W_m2'),
      transmittance: number(row, 'T_above'),
      cloudFraction: number(row, 'cloud_fraction'),
      surfaceAlbedo: number(row, 'surface_albedo'),
      opticalDepth: number(row, 'tau'),
      singleScatteringAlbedo: number(row, 'omega'),
      upscatterFraction: number(row, 'beta_mean'),
    });
    expectNear(answer.shortwaveWm2!, number(row, 'dF_TOA_W_m2'), 1e-8);
    expect(answer.netWm2).toBe(answer.shortwaveWm2! + answer.longwaveWm2!);
  }
});

// Products by hand: −Q T² (1 − A_c) Δα with Q = 340, T = 0.76, A_c = 0.6, Δα = 0.01; efficiencies times 0.1.
test('forcing: simple albedo and efficiency by hand', async () => {
  const simple = { method: 'simple-albedo', insolationWm2: 340, transmittance: 0.76, cloudFraction: 0.6 };
  const { shortwaveWm2 } = await answerOf('forcing', { ...simple, albedoChange: 0.01 });
  expectNear(shortwaveWm2!, -340 * 0.76 ** 2 * 0.4 * 0.01, 1e-12);
  const efficiency = { method: 'efficiency', opticalDepth: 0.1, shortwaveEfficiencyWm2: -33 };
  const answer = await answerOf('forcing', { ...efficiency, longwaveEfficiencyWm2: 8 });
  expectNear(answer.netWm2!, -2.5, 1e-12);
  expect(answer.criticalSingleScatteringAlbedo).toBeNull();
});

test('upscatter: the forty-digit series, and its hemispheric mean', async () => {
  for (const row of rowsOf('optics/upscatter_mu0.csv')) {
    const body = { asymmetry: number(row, 'g'), cosSolarZenith: number(row, 'mu0') };
    expectNear((await answerOf('upscatter', body)).upscatterFraction!, number(row, 'beta_mu0'), 1e-11);
  }
  for (const row of rowsOf('optics/upscatter_mean.csv', 5)) {
    const answer = await answerOf('upscatter', { asymmetry: number(row, 'g') });
    expectNear(answer.upscatterFraction!, number(row, 'beta_mean_isotropic'), 1e-11);
  }
});

test('greenhouse: the independent values of three formulas', async () => {
  for (const row of rowsOf('general/ghg_forcing.csv')) {
    const answer = await answerOf('greenhouse', {
      co2Ppm: number(row, 'co2_ppm'),
      ch4Ppb: number(row, 'ch4_ppb'),
      n2oPpb: number(row, 'n2o_ppb'),
      reference: {
        co2Ppm: number(row, 'co2_0_ppm'),
        ch4Ppb: number(row, 'ch4_0_ppb'),
        n2oPpb: number(row, 'n2o_0_ppb'),
      },
      formula: row.scheme,
    });
    expectNear(answer.totalWm2!, number(row, 'forcing_total_W_m2'), 1e-8);
  }
});

// Kok et al. (2021): some 5000 Tg a year over 5.1e14 m², 1.9 days, 0.59 m² a gram: a depth near 0.03.
test('column: deposition to burden to optical depth', async () => {
  const body = { depositionGM2Yr: 5000e12 / 5.1e14, lifetimeDays: 1.9, massExtinctionM2PerG: 0.59 };
  const answer = await answerOf('column', body);
  expectNear(answer.burdenGM2!, (body.depositionGM2Yr * 1.9) / 365.25, 1e-12);
  expectNear(answer.opticalDepth!, 0.03, 0.03);
});

test('humidity-growth: the closed form of an independent program', async () => {
  for (const row of rowsOf('general/kappa_koehler_growth.csv')) {
    const body = { kappa: number(row, 'kappa'), relativeHumidity: number(row, 'relative_humidity') };
    expectNear(
      (await answerOf('humidity-growth', body)).diameterGrowthFactor!,
      number(row, 'growth_factor_no_kelvin'),
    );
  }
});

test('region-areas: every region of the independent table', async () => {
  const { regions } = (await answerOf('region-areas', { regionSet: 'ar6' })) as never as {
    regions: { code: string; name: string; areaKm2: number; shareOfSphere: number }[];
  };
  const rows = readCsv('checks/general/ar6_region_areas.csv');
  expect(regions).toHaveLength(58);
  expect(rows.length).toBeGreaterThan(40);
  for (const row of rows) {
    const region = regions.find(({ code }) => code === row.acronym)!;
    expectNear(region.areaKm2, number(row, 'area_km2_R_6371.007181'));
    expectNear(region.shareOfSphere, number(row, 'fraction_of_sphere'), 1e-9, 0);
  }
});

const LAYER = {
  method: 'thin-layer',
  transmittance: 0.76,
  cloudFraction: 0.6,
  surfaceAlbedo: 0.1,
  opticalDepth: 0.05,
  singleScatteringAlbedo: 0.9,
  upscatterFraction: 0.2,
};
const GASES = { co2Ppm: 190, ch4Ppb: 375, n2oPpb: 200 };

test.each([
  ['orbit', { ageKaBp: 1e9 }, 'ageKaBp'],
  ['insolation', { ageKaBp: 6, latitudeDeg: 91, solarLongitudeDeg: 90 }, 'latitudeDeg'],
  ['forcing', { ...LAYER, surfaceAlbedo: 1.2 }, 'surfaceAlbedo'],
  ['forcing', { ...LAYER, opticalDepth: -0.1 }, 'opticalDepth'],
  ['forcing', { ...LAYER, singleScatteringAlbedo: 1.0001 }, 'singleScatteringAlbedo'],
  ['upscatter', { asymmetry: 1.5 }, 'asymmetry'],
  ['upscatter', { asymmetry: 0.6, cosSolarZenith: -0.2 }, 'cosSolarZenith'],
  ['greenhouse', { ...GASES, co2Ppm: 0, reference: GASES, formula: 'myhre1998' }, 'co2Ppm'],
  ['column', { depositionGM2Yr: 1, lifetimeDays: -1, massExtinctionM2PerG: 0.6 }, 'lifetimeDays'],
  ['humidity-growth', { kappa: 0.5, relativeHumidity: 1 }, 'relativeHumidity'],
])(
  '%s out of range is refused with the field, its value and what is allowed: %j',
  async (name, body, field) => {
    const refused = await modeller.post(`${CALCULATORS}/${name}`, body).expect(422);
    expect(refused.type).toBe('application/problem+json');
    const [error] = refused.body.errors;
    expect(error).toMatchObject({
      field,
      pointer: `/${field}`,
      value: (body as Record<string, unknown>)[field],
    });
    expect(error.allowed).toHaveLength(2);
    expect(refused.body.detail).toContain(field);
  },
);

test.each([
  ['orbit', { ageKaBp: 21 }],
  ['insolation', { ageKaBp: 6, latitudeDeg: 65, solarLongitudeDeg: 90 }],
  ['forcing', LAYER],
  ['upscatter', { asymmetry: 0.6 }],
  ['greenhouse', { ...GASES, reference: GASES, formula: 'myhre1998' }],
  ['column', { depositionGM2Yr: 1, lifetimeDays: 2, massExtinctionM2PerG: 0.6 }],
  ['humidity-growth', { kappa: 0.5, relativeHumidity: 0.5 }],
  ['region-areas', { regionSet: 'ar6' }],
])('%s refuses a field it does not use, text for a number and what is missing', async (name, body) => {
  const post = (sent: object) => modeller.post(`${CALCULATORS}/${name}`, sent);
  await post(body).expect(200);
  expect((await post({ ...body, colour: 'blue' }).expect(422)).body.errors[0].field).toBe('colour');
  const [field] = Object.keys(body).filter((key) => key !== 'method');
  expect((await post({ ...body, [field!]: [] }).expect(422)).body.errors[0].field).toBe(field);
  expect((await post({}).expect(422)).body.errors.length).toBeGreaterThan(0);
  const list = await modeller.post(`${CALCULATORS}/${name}`, [body]);
  expect(list.status).toBe(422);
});

test('numbers beyond the doubles, keys given twice and broken JSON are refused, not rounded', async () => {
  for (const text of [
    '{"ageKaBp": 1e999}',
    '{"ageKaBp": 1, "ageKaBp": 2}',
    '{"ageKaBp": NaN}',
    '{"ageKaBp": 1',
  ]) {
    const refused = await modeller
      .post(`${CALCULATORS}/orbit`)
      .type('application/json')
      .send(text)
      .expect(400);
    expect(refused.body.code).toBe('malformed-json');
  }
});

test('a reading access token suffices, a stranger is told to sign in, and other methods are not allowed', async () => {
  const wanted = { name: 'script', scopes: ['read'], expiresInDays: 1 };
  const { token } = (await modeller.post('/api/v1/me/access-tokens', wanted).expect(201)).body;
  const call = () => service.stranger().post(`${CALCULATORS}/orbit`).send({ ageKaBp: 21 });
  await call().set('Authorization', `Bearer ${token}`).expect(200);
  await call().set('Authorization', 'Bearer forged').expect(401);
  expect((await call().expect(401)).body.code).toBe('not-signed-in');
  const wrong = await modeller.get(`${CALCULATORS}/orbit`);
  expect([404, 405]).toContain(wrong.status);
});
