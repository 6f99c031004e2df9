import type { DeskView, SearchHit } from '@siltlight/common/wire/desk';
import { ESTIMATES, estimated } from './support/estimating';
import { type DemoName, signedInAs, type SignedInCaller } from './support/sign-in';
import { described, handedIn } from './support/submitting';
import { testApp, type TestApp } from './support/test-app';

let service: TestApp;
const people = new Map<DemoName, SignedInCaller>();
beforeAll(async () => {
  service = await testApp({ seeded: true });
  for (const name of ['scientist', 'scientist2', 'steward', 'steward2', 'modeller', 'admin'] as const) {
    people.set(name, await signedInAs(service, name));
  }
});
afterAll(() => service.close());

const who = (name: DemoName) => people.get(name)!;
const deskOf = async (name: DemoName) => (await who(name).get('/api/v1/desk').expect(200)).body as DeskView;
const find = async (name: DemoName, text: string) =>
  (
    await who(name)
      .get(`/api/v1/search?q=${encodeURIComponent(text)}`)
      .expect(200)
  ).body.items as SearchHit[];

test('a steward sees the queue, oldest first, with their own submissions told apart', async () => {
  await handedIn(who('steward2'), undefined, 'own.csv');
  const { queue, mySubmissions, lately } = await deskOf('steward2');
  expect(queue.map(({ own }) => own)).toEqual([false, true]);
  expect(queue.map(({ waitsSince }) => waitsSince)).toEqual(queue.map(({ waitsSince }) => waitsSince).sort());
  expect(mySubmissions).toHaveLength(1);
  expect(lately.length).toBeGreaterThan(5);
  for (const { summary } of lately) expect(summary.length).toBeGreaterThan(5);
  expect((await deskOf('steward')).queue.map(({ own }) => own)).toEqual([false, false]);
});

test('a scientist sees their submissions and what waits for their word, and no queue', async () => {
  const estimate = await estimated(who('scientist2'), { title: 'Waits for a word' });
  const desk = await deskOf('scientist');
  expect(desk).toMatchObject({ queue: [], stale: [] });
  // Their own acts, and no comings and goings.
  expect(desk.lately.some(({ summary }) => summary.startsWith('S-0005'))).toBe(true);
  expect(desk.lately.some(({ summary }) => /signed in|S-0004/i.test(summary))).toBe(false);
  expect(desk.mySubmissions.map(({ state }) => state)).toEqual(['returned']);
  expect(desk.awaitingSignOff.map(({ id }) => id)).toEqual([estimate.id]);
  expect((await deskOf('scientist2')).awaitingSignOff).toEqual([]);
  await who('scientist').post(`${ESTIMATES}/${estimate.id}/sign-off`).expect(200);
  expect((await deskOf('scientist')).awaitingSignOff).toEqual([]);
});

test('a modeller sees the latest published estimate of each slice and nothing of the work before it', async () => {
  const desk = await deskOf('modeller');
  expect(desk).toMatchObject({ queue: [], mySubmissions: [], awaitingSignOff: [], lately: [] });
  const slices = desk.latestPublished.map(({ sliceSlug }) => sliceSlug);
  expect(slices.sort()).toEqual(['heinrich-stadial-1', 'lgm', 'mid-holocene', 'mis-2']);
  expect(desk.latestPublished.every(({ state }) => state === 'published')).toBe(true);
});

test('an administrator sees what has happened lately, and no queue', async () => {
  const desk = await deskOf('admin');
  expect(desk).toMatchObject({ queue: [], mySubmissions: [], awaitingSignOff: [] });
  expect(desk.lately.length).toBeGreaterThan(5);
});

test('search finds slices, datasets, sites and estimates by a part of their name, in any case', async () => {
  const kinds = async (text: string) => (await find('modeller', text)).map(({ kind, path }) => [kind, path]);
  expect(await kinds('last GLACIAL max')).toContainEqual(['slice', '/slices/lgm']);
  expect((await kinds('loess transect'))[0]![0]).toBe('dataset');
  const [site] = await find('modeller', 'qx-12');
  expect(site).toMatchObject({ kind: 'site', title: 'QX-12', path: expect.stringContaining('?site=QX-12') });
  expect((await kinds('mid-holocene')).map(([kind]) => kind)).toEqual(
    expect.arrayContaining(['slice', 'estimate']),
  );
  expect(await find('modeller', 'nothing of this name')).toEqual([]);
  expect(await find('modeller', '%')).toEqual([]);
});

test('search shows to nobody what they may not open', async () => {
  const estimate = await estimated(who('scientist'), { title: 'Zephyr run' });
  const draft = await described(who('scientist'), undefined, 'zephyr.csv', { title: 'Zephyr sheet' });
  const pathsFor = async (name: DemoName) => (await find(name, 'zephyr')).map(({ path }) => path);
  expect((await pathsFor('scientist')).sort()).toEqual(
    [`/estimates/${estimate.id}`, `/intake/${draft.detail.id}`].sort(),
  );
  expect(await pathsFor('steward')).toEqual([`/estimates/${estimate.id}`]);
  expect(await pathsFor('modeller')).toEqual([]);
});

test('an empty or missing search is refused by name', async () => {
  for (const query of ['', '?q=', '?q=%20']) {
    const refused = await who('modeller').get(`/api/v1/search${query}`).expect(422);
    expect(refused.body.errors[0].pointer).toContain('q');
  }
});

const R = ['scientist', 'steward', 'modeller', 'admin'] as const;
type Matrix = [method: 'get' | 'post', path: string, status: number, allowed: readonly DemoName[]];
/** Answers to those who may; everybody else gets 403, and strangers 401. */
const ROUTES: Matrix[] = [
  ['get', '/api/v1/desk', 200, R],
  ['get', '/api/v1/search?q=lgm', 200, R],
  ['get', '/api/v1/slices/column', 200, R],
  ['get', '/api/v1/slices/lgm', 200, R],
  ['get', ESTIMATES, 200, R],
  ['post', ESTIMATES, 422, ['scientist']],
  ['post', `${ESTIMATES}/preview`, 422, ['scientist']],
  ['get', `${ESTIMATES}/none`, 404, R],
  ['get', `${ESTIMATES}/none/run-record`, 404, R],
  ['post', `${ESTIMATES}/none/sign-off`, 404, ['scientist', 'steward']],
  ['post', `${ESTIMATES}/none/withdraw`, 422, ['scientist', 'steward']],
  ['post', `${ESTIMATES}/none/run-again`, 404, ['scientist']],
  ['get', '/api/v1/exports', 200, R],
  ['post', '/api/v1/exports', 422, R],
  ['get', '/api/v1/exports/none', 404, R],
  ['get', '/api/v1/exports/none/file', 404, R],
  ['get', '/api/v1/exports/none/descriptor', 404, R],
];

test.each(ROUTES)(
  '%s %s answers %i to the roles that may, 403 to others, 401 to strangers',
  async (method, path, status, allowed) => {
    const send = {
      get: (name: DemoName) => who(name).get(path),
      post: (name: DemoName) => who(name).post(path, {}),
    };
    for (const role of R) {
      const answer = await send[method](role);
      expect([role, answer.status]).toEqual([role, allowed.includes(role) ? status : 403]);
    }
    const stranger = await service.stranger()[method](path);
    expect(stranger.status).toBe(401);
    expect(stranger.headers['content-type']).toContain('application/problem+json');
  },
);
