import { signedInAs, type SignedInCaller } from './support/sign-in';
import { testAppWithPeople } from './support/demo-people';
import type { TestApp } from './support/test-app';

let service: TestApp;
let modeller: SignedInCaller;
beforeAll(async () => {
  service = await testAppWithPeople();
  modeller = await signedInAs(service, 'modeller');
});
afterAll(() => service.close());

const ask = (name: string, body: object) => modeller.post(`/api/v1/calculators/${name}`, body);
const layer = { opticalDepth: 0.01, singleScatteringAlbedo: 0.75, asymmetry: 0.6, surfaceAlbedo: 0.1 };

// First row of checks/optics/rt_exact_layer.csv: 7 of 8 decimals to be trusted.
test('the layer calculator answers the exact planetary albedo with its method and cautions', async () => {
  const { body } = await ask('layer', { ...layer, cosSolarZenith: 0.1, scheme: 'multi-stream' }).expect(200);
  expect(Math.abs(body.reflectance - 0.12436865)).toBeLessThan(5e-7);
  expect(Object.keys(body).sort()).toEqual([
    'absorptance',
    'cautions',
    'method',
    'reflectance',
    'transmittance',
  ]);
  expect(body.method.source).toContain('1980');
});

test('the forcing calculator answers by slanted layer, two-stream and multi-stream', async () => {
  for (const method of ['slanted-layer', 'two-stream', 'multi-stream']) {
    const { body } = await ask('forcing', {
      ...layer,
      method,
      transmittance: 0.76,
      cloudFraction: 0.6,
    }).expect(200);
    // Exact mean albedo change 2.0304e-3 (checks/optics/error_mean_case.csv); delta-Eddington is off by 14 %.
    const exact = -(1361 / 4) * 0.76 ** 2 * 0.4 * 2.0304e-3;
    expect(Math.abs(body.shortwaveWm2 / exact - 1)).toBeLessThan(method === 'two-stream' ? 0.15 : 0.01);
    expect(body.netWm2).toBe(body.shortwaveWm2);
  }
});

test('a value out of its range, and an unknown scheme, are answered 422 with field, value and range', async () => {
  const refused = await ask('layer', { ...layer, surfaceAlbedo: 1.5, scheme: 'multi-stream' }).expect(422);
  expect(refused.type).toBe('application/problem+json');
  expect(JSON.stringify(refused.body)).toContain('surfaceAlbedo is 1.5; it must lie within 0 to 1');
  await ask('layer', { ...layer, scheme: 'guess' }).expect(422);
});
