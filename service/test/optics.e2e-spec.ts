import { checksumOf } from '../src/versions/canonical';
import { estimated, smallRequest } from './support/estimating';
import { signedInAs, type SignedInCaller } from './support/sign-in';
import { testApp, type TestApp } from './support/test-app';

const SETS = '/api/v1/optical-sets';
let service: TestApp;
let author: SignedInCaller;
let other: SignedInCaller;
let modeller: SignedInCaller;
beforeAll(async () => {
  service = await testApp({ seeded: true });
  [author, other, modeller] = (await Promise.all(
    (['scientist', 'scientist2', 'modeller'] as const).map((name) => signedInAs(service, name)),
  )) as [SignedInCaller, SignedInCaller, SignedInCaller];
});
afterAll(() => service.close());

const mode = {
  name: 'All',
  medianRadiusUm: 0.5,
  geometricStdDev: 2,
  numberFraction: 1,
  minRadiusUm: 0.02,
  maxRadiusUm: 5,
  densityGCm3: 2.6,
  index: { kind: 'typed', real: 1.53, imaginary: 0.003 },
};
const definition = {
  modes: [mode],
  kappa: 0,
  relativeHumidity: 0,
  coarseFactor: null,
  shapeFactor: null,
  spread: { radiusFactor: 1.2, absorptionFactor: 2 },
};
const draft = {
  species: 'dust',
  basis: { kind: 'particles', definition },
  sizeCutoff: 'radius to 5 µm',
  source: 'invented for a test',
  evidence: 'assumption',
  note: '',
};
const withMode = (change: object) => ({
  ...draft,
  title: 'Broken',
  basis: { kind: 'particles', definition: { ...definition, modes: [{ ...mode, ...change }] } },
});
const measured = (wavelengthUm: number) => ({
  wavelengthUm,
  massExtinctionM2PerG: { low: 0.4, central: 0.6, high: 0.8 },
  singleScatteringAlbedo: { low: 0.9, central: 0.94, high: 0.97 },
  asymmetry: { low: 0.65, central: 0.7, high: 0.75 },
});
const begin = async (title: string, change: object = {}) =>
  (await author.post(SETS, { ...draft, title, ...change }).expect(201)).body;
const save = (caller: SignedInCaller, versionId: string, body: object, checksum: string) =>
  caller.put(`${SETS}/${versionId}`, body).set('If-Match', `"${checksum}"`);

test('the ready-made sets and the three older ones are published, with intervals round their values', async () => {
  const { items } = (await modeller.get(SETS).expect(200)).body;
  const slugs = items.map(({ slug }: { slug: string }) => slug);
  for (const slug of [
    'dust-broadband',
    'dust-19-soils',
    'dust-north-african',
    'dust-pm20-desert',
    'sulfate',
  ]) {
    expect(slugs).toContain(slug);
  }
  expect(slugs.length).toBeGreaterThanOrEqual(16);
  for (const set of items) {
    expect(set).toMatchObject({ state: 'published', number: 1, wavelengthUm: 0.55 });
    expect(set.source).not.toBe('');
    for (const span of [set.singleScatteringAlbedo, set.asymmetry, set.massExtinctionM2PerG]) {
      expect(span.low).toBeLessThanOrEqual(span.central);
      expect(span.central).toBeLessThanOrEqual(span.high);
    }
  }
});

test('a ready-made set tells the particles it is computed from', async () => {
  const { body } = await modeller.get(`${SETS}/dust-transported`).expect(200);
  expect(body.basis.definition.modes[0]).toMatchObject({ medianRadiusUm: 0.5, geometricStdDev: 2.2 });
  expect(body.createdBy).toBeNull();
  expect(body.rights).toEqual({ mayEdit: false, mayPublish: false, mayAddVersion: false });
});

test('a draft gets its values computed by the service and is its author’s alone', async () => {
  const set = await begin('Alone');
  const { body: calculated } = await modeller.post('/api/v1/calculators/mode-optics', {
    wavelengthUm: 0.55,
    modes: [
      {
        medianRadiusUm: 0.5,
        geometricStdDev: 2,
        minRadiusUm: 0.02,
        maxRadiusUm: 5,
        densityGCm3: 2.6,
        refractiveIndex: { real: 1.53, imaginary: 0.003 },
      },
    ],
  });
  // Four figures are kept.
  expect(set.singleScatteringAlbedo.central).toBeCloseTo(calculated.singleScatteringAlbedo, 3);
  expect(set.massExtinctionM2PerG.central).toBeCloseTo(calculated.massExtinctionM2PerG, 3);
  expect(set.singleScatteringAlbedo.low).toBeLessThan(set.singleScatteringAlbedo.central);
  expect(set).toMatchObject({ state: 'draft', rights: { mayEdit: true, mayPublish: true } });
  for (const caller of [other, modeller]) {
    await caller.get(`${SETS}/alone`).expect(404);
    await caller.get(`${SETS}/alone/versions`).expect(404);
    await caller.get(`${SETS}/alone/versions/1`).expect(404);
  }
  await save(other, set.versionId, draft, set.checksum).expect(404);
  await other.post(`${SETS}/${set.versionId}/publish`).expect(404);
  await other.post(`${SETS}/alone/versions`, draft).expect(404);
  const own = (await author.get(`${SETS}?state=draft`).expect(200)).body.items;
  expect(own.map(({ slug }: { slug: string }) => slug)).toContain('alone');
  expect((await other.get(`${SETS}?state=draft`).expect(200)).body.items).toEqual([]);
  expect(JSON.stringify((await other.get(SETS)).body)).not.toContain(set.versionId);
});

test('a draft cannot be used by an estimate, not even by its author', async () => {
  const { versionId } = await begin('Not yet');
  const request = await smallRequest(author, { opticalSetVersionId: versionId });
  const refused = await author.post('/api/v1/estimates', request).expect(422);
  expect(refused.body.errors[0].field).toBe('opticalSetVersionId');
});

test('saving asks for the draft that was changed, and a stale one is refused', async () => {
  const set = await begin('Changing');
  const changed = { ...draft, note: 'changed' };
  await author.put(`${SETS}/${set.versionId}`, changed).expect(428);
  const saved = (await save(author, set.versionId, changed, set.checksum).expect(200)).body;
  expect(saved.note).toBe('changed');
  expect(saved.checksum).not.toBe(set.checksum);
  await save(author, set.versionId, draft, set.checksum).expect(412);
});

test('a published set cannot be changed, is told in the ledger, and a second version supersedes it', async () => {
  const set = await begin('To be kept');
  const published = (await author.post(`${SETS}/${set.versionId}/publish`).expect(200)).body;
  expect(published).toMatchObject({ state: 'published', checksum: set.checksum });
  const refused = await save(author, set.versionId, draft, set.checksum).expect(409);
  expect(refused.body.detail).toMatch(/cannot be changed/);
  await author.post(`${SETS}/${set.versionId}/publish`).expect(409);
  await save(other, set.versionId, draft, set.checksum).expect(403);
  await other.post(`${SETS}/to-be-kept/versions`, draft).expect(403);
  const second = (await author.post(`${SETS}/to-be-kept/versions`, { ...draft, note: 'two' }).expect(201))
    .body;
  await author.post(`${SETS}/to-be-kept/versions`, draft).expect(409);
  expect((await other.get(`${SETS}/to-be-kept`).expect(200)).body.number).toBe(1);
  expect((await author.get(`${SETS}/to-be-kept`).expect(200)).body.number).toBe(2);
  await author.post(`${SETS}/${second.versionId}/publish`).expect(200);
  const { items } = (await modeller.get(`${SETS}/to-be-kept/versions`).expect(200)).body;
  expect(items.map(({ state }: { state: string }) => state)).toEqual(['superseded', 'published']);
  const steward = await signedInAs(service, 'steward');
  const ledger = (await steward.get('/api/v1/ledger?objectKind=optical-set&limit=50').expect(200)).body;
  const verbs = ledger.items.map(({ verb }: { verb: string }) => verb);
  expect(verbs).toEqual(expect.arrayContaining(['draft-optical-set', 'publish-optical-set']));
});

test('an estimate runs on a published set and names it', async () => {
  const set = await begin('For an estimate');
  await author.post(`${SETS}/${set.versionId}/publish`).expect(200);
  const detail = await estimated(author, { opticalSetVersionId: set.versionId });
  expect(detail.opticalSetTitle).toBe('For an estimate, version 1');
});

test('measured values stand as typed, and need a wavelength in mid-visible light', async () => {
  const rows = [measured(0.44), measured(0.532), measured(0.87)];
  const set = await begin('Measured', { basis: { kind: 'measured', rows } });
  expect(set).toMatchObject({ wavelengthUm: 0.532, asymmetry: { low: 0.65, central: 0.7, high: 0.75 } });
  expect(set.basis.rows).toHaveLength(3);
  const body = { ...draft, title: 'Far away', basis: { kind: 'measured', rows: [measured(1.6)] } };
  const refused = await author.post(SETS, body).expect(422);
  expect(refused.body.detail).toMatch(/0\.5 to 0\.6 µm/);
  const falling = { ...measured(0.55), asymmetry: { low: 0.8, central: 0.7, high: 0.75 } };
  const crossed = { ...body, basis: { kind: 'measured', rows: [falling] } };
  expect((await author.post(SETS, crossed).expect(422)).body.detail).toMatch(/must rise/);
});

test.each([
  [{ medianRadiusUm: 0 }, '/basis/definition/modes/0/medianRadiusUm', /0\.0001 to 100 µm/],
  [{ geometricStdDev: 1 }, '/basis/definition/modes/0/geometricStdDev', /1\.01 to 5/],
  [{ maxRadiusUm: 0.01 }, '/basis/definition/modes/0/maxRadiusUm', /above/],
  [{ numberFraction: 0 }, '/basis/definition/modes/0/numberFraction', /above 0/],
  [{ index: { kind: 'material', material: 'cheese' } }, '/basis/definition/modes/0/index/material', /tables/],
  [
    { index: { kind: 'typed', real: 1.5, imaginary: -1 } },
    '/basis/definition/modes/0/index/imaginary',
    /0 to 10/,
  ],
])('the mode %j is refused at its own field with what is allowed', async (change, pointer, allowed) => {
  const refused = await author.post(SETS, withMode(change)).expect(422);
  expect(refused.type).toBe('application/problem+json');
  expect(refused.body.errors[0].pointer).toBe(pointer);
  expect(refused.body.errors[0].message).toMatch(allowed);
});

test('shares of a mixture that miss 1 are refused with the remedy', async () => {
  const index = {
    kind: 'mixture',
    rule: 'bruggeman',
    parts: [
      { material: 'quartz', volumeFraction: 0.5 },
      { material: 'hematite', volumeFraction: 0.1 },
    ],
  };
  const refused = await author.post(SETS, withMode({ index })).expect(422);
  expect(refused.body.detail).toMatch(/add up to 1/);
});

test('source and evidence must be told, a set is not called “new”, and nothing unknown is taken in silence', async () => {
  await author.post(SETS, { ...draft, title: 'No source', source: '' }).expect(422);
  await author.post(SETS, { ...draft, title: 'No evidence', evidence: ' ' }).expect(422);
  await author.post(SETS, { ...draft, title: 'New' }).expect(422);
  await author.post(SETS, { ...draft, title: 'Values of my own', asymmetry: 0.7 }).expect(422);
});

test('only scientists write, everybody signed in reads, strangers see nothing', async () => {
  const writes: [method: 'post' | 'put', path: string][] = [
    ['post', SETS],
    ['post', `${SETS}/sulfate/versions`],
    ['put', `${SETS}/none`],
    ['post', `${SETS}/none/publish`],
  ];
  for (const [method, path] of writes) {
    expect((await modeller[method](path, {}).expect(403)).body.code).toBe('role-needed');
    await service.stranger()[method](path).send({}).expect(401);
  }
  for (const path of [SETS, `${SETS}/sulfate`, `${SETS}/sulfate/versions`, `${SETS}/sulfate/versions/1`]) {
    await modeller.get(path).expect(200);
    await service.stranger().get(path).expect(401);
  }
  await modeller.get(`${SETS}/no-such-set`).expect(404);
  await modeller.get(`${SETS}/sulfate/versions/9`).expect(404);
});

test('what is shipped has the checksum of its content', async () => {
  const { body } = await modeller.get(`${SETS}/sulfate`).expect(200);
  const { singleScatteringAlbedo, asymmetry, massExtinctionM2PerG, wavelengthUm, sizeCutoff } = body;
  const { source, evidence, note, species, basis } = body;
  const told = { source, evidence, note, species, basis };
  const content = {
    singleScatteringAlbedo,
    asymmetry,
    massExtinctionM2PerG,
    wavelengthUm,
    sizeCutoff,
    ...told,
  };
  expect(checksumOf(content)).toBe(body.checksum);
});

const calculate = (name: string, body: object) => modeller.post(`/api/v1/calculators/${name}`, body);

// MIEV0 case 7 (Wiscombe), as printed to six decimals: qSca 2.232265, g 0.896473.
test('the mie calculator answers a published case with its method', async () => {
  const sphere = { sizeParameter: 10, refractiveIndex: { real: 0.75, imaginary: 0 } };
  const { body } = await calculate('mie', sphere).expect(200);
  expect(Math.abs(body.qSca - 2.232265)).toBeLessThan(1e-6);
  expect(Math.abs(body.asymmetry - 0.896473)).toBeLessThan(1e-6);
  expect(body.method.source).toMatch(/1908/);
  const refused = await calculate('mie', { ...sphere, sizeParameter: 1e6 }).expect(422);
  expect(refused.body.errors[0]).toMatchObject({ field: 'sizeParameter', value: 1e6 });
});

// Rows of checks/optics/lognormal_modes.csv and mixing_rules.csv; 1e-4 is the stated error of the size integral.
test('the calculators of modes and of mixed indices answer their check rows', async () => {
  const fine = { medianRadiusUm: 0.1, geometricStdDev: 1.6, minRadiusUm: 0.005, maxRadiusUm: 10 };
  const refractiveIndex = { real: 1.53, imaginary: 0.003 };
  const modes = [{ ...fine, densityGCm3: 2.65, refractiveIndex }];
  const optics = (await calculate('mode-optics', { wavelengthUm: 0.44, modes }).expect(200)).body;
  expect(Math.abs(optics.massExtinctionM2PerG / 3.73264 - 1)).toBeLessThan(1e-4);
  expect(Math.abs(optics.singleScatteringAlbedo / 0.9843524 - 1)).toBeLessThan(1e-4);
  const components = [
    { volumeFraction: 0.985, refractiveIndex: { real: 1.53, imaginary: 0.001 } },
    { volumeFraction: 0.015, refractiveIndex: { real: 3.1, imaginary: 0.09 } },
  ];
  const mixed = (await calculate('mixed-index', { rule: 'bruggeman', components }).expect(200)).body;
  expect(Math.abs(mixed.refractiveIndex.real - 1.54769398219)).toBeLessThan(1e-9);
  expect(Math.abs(mixed.refractiveIndex.imaginary - 0.00167454555379)).toBeLessThan(1e-11);
  const broken = { rule: 'bruggeman', components: components.slice(0, 1) };
  expect((await calculate('mixed-index', broken).expect(422)).body.detail).toMatch(/add up to 1/);
  await calculate('mode-optics', { wavelengthUm: 0.44, modes: [] }).expect(422);
});

test('the optics calculators answer anybody signed in, whatever the role, and nobody else', async () => {
  const refractiveIndex = { real: 1.53, imaginary: 0.003 };
  const size = { medianRadiusUm: 0.1, geometricStdDev: 1.6, minRadiusUm: 0.005, maxRadiusUm: 10 };
  const layer = { opticalDepth: 0.01, singleScatteringAlbedo: 0.75, asymmetry: 0.6, surfaceAlbedo: 0.1 };
  const requests: [name: string, body: object][] = [
    ['mie', { sizeParameter: 1, refractiveIndex }],
    ['mode-optics', { wavelengthUm: 0.55, modes: [{ ...size, densityGCm3: 2.6, refractiveIndex }] }],
    ['mixed-index', { rule: 'bruggeman', components: [{ volumeFraction: 1, refractiveIndex }] }],
    ['layer', { ...layer, cosSolarZenith: 0.5, scheme: 'multi-stream' }],
  ];
  const steward = await signedInAs(service, 'steward');
  const admin = await signedInAs(service, 'admin');
  for (const [name, body] of requests) {
    const path = `/api/v1/calculators/${name}`;
    for (const caller of [author, modeller, steward, admin]) {
      await caller.post(path, body).expect(200);
      await caller.post(path, {}).expect(422);
    }
    await service.stranger().post(path).send(body).expect(401);
  }
});
