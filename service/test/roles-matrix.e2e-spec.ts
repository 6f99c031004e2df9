import type { Test } from 'supertest';
import { testAppWithPeople } from './support/demo-people';
import { type DemoName, signedInAs, type SignedInCaller } from './support/sign-in';
import { approved, handedIn, SUBMISSIONS } from './support/submitting';
import type { TestApp } from './support/test-app';

type Method = 'get' | 'post' | 'put' | 'delete';
type RoleName = Extract<DemoName, 'scientist' | 'steward' | 'modeller' | 'admin'>;

const ALL: RoleName[] = ['scientist', 'steward', 'modeller', 'admin'];
const INTAKE: RoleName[] = ['scientist', 'steward'];
const STEWARD: RoleName[] = ['steward'];
const SCIENTIST: RoleName[] = ['scientist'];

let service: TestApp;
let people: Record<RoleName, SignedInCaller>;
/** addresses of what the routes are tried on */
let places: Record<string, string>;
beforeAll(async () => {
  service = await testAppWithPeople();
  const callers = await Promise.all(ALL.map((name) => signedInAs(service, name)));
  people = Object.fromEntries(ALL.map((name, index) => [name, callers[index]])) as typeof people;
  const submitted = await handedIn(people.scientist);
  const published = await approved(people.scientist, people.steward);
  const slug = published.detail.dataset!.slug;
  const version = (await people.modeller.get(`/api/v1/datasets/${slug}`).expect(200)).body.version.versionId;
  const request = { sliceSlug: 'lgm', way: 'regional-scaling', datasetVersionIds: [version] };
  const field = (await people.scientist.post('/api/v1/fields', request).expect(201)).body.versionId;
  places = { ':submission': submitted.detail.id, ':slug': slug, ':field': field };
});
afterAll(() => service.close());

/** Every route of intake, review, holdings, slices, fields, optics and calculators, as the design gives it. */
const ROUTES: [Method, string, RoleName[]][] = [
  ['get', SUBMISSIONS, INTAKE],
  ['post', SUBMISSIONS, INTAKE],
  ['get', `${SUBMISSIONS}/template`, ALL],
  ['get', '/api/v1/rules', ALL],
  ...['', '/grid', '/findings', '/file', '/history'].map((what): [Method, string, RoleName[]] => [
    'get',
    `${SUBMISSIONS}/:submission${what}`,
    INTAKE,
  ]),
  ['put', `${SUBMISSIONS}/:submission/mapping`, INTAKE],
  ['put', `${SUBMISSIONS}/:submission/metadata`, INTAKE],
  ...['corrections', 'leave-out', 'take-back', 'submit', 'withdraw', 'queries/none/replies'].map(
    (act): [Method, string, RoleName[]] => ['post', `${SUBMISSIONS}/:submission/${act}`, INTAKE],
  ),
  ['delete', `${SUBMISSIONS}/:submission/corrections/none`, INTAKE],
  ...['claim', 'release', 'waivers', 'queries', 'decision'].map((act): [Method, string, RoleName[]] => [
    'post',
    `${SUBMISSIONS}/:submission/${act}`,
    STEWARD,
  ]),
  ['get', '/api/v1/datasets', ALL],
  ['get', '/api/v1/datasets/:slug', ALL],
  ...['', '/samples', '/content', '/file', '/provenance', '/cells'].map(
    (what): [Method, string, RoleName[]] => ['get', `/api/v1/datasets/:slug/versions/1${what}`, ALL],
  ),
  ['post', '/api/v1/datasets/:slug/versions/1/withdraw', STEWARD],
  ['get', '/api/v1/slices', ALL],
  ['get', '/api/v1/regions/ar6', ALL],
  ['get', '/api/v1/optical-sets', ALL],
  ['get', '/api/v1/backdrops', ALL],
  ['get', '/api/v1/fields', ALL],
  ['post', '/api/v1/fields', SCIENTIST],
  ['post', '/api/v1/fields/preview', SCIENTIST],
  ...['', '/grid', '/trace'].map((what): [Method, string, RoleName[]] => [
    'get',
    `/api/v1/fields/:field${what}`,
    ALL,
  ]),
  ...[
    'orbit',
    'insolation',
    'forcing',
    'upscatter',
    'greenhouse',
    'column',
    'humidity-growth',
    'region-areas',
    'check-file',
  ].map((name): [Method, string, RoleName[]] => ['post', `/api/v1/calculators/${name}`, ALL]),
];

const at = (path: string) => path.replace(/:\w+/g, (name) => places[name]!);
const ask = (caller: SignedInCaller, method: Method, path: string, body?: object): Test =>
  method === 'get' || method === 'delete' ? caller[method](at(path)) : caller[method](at(path), body);

test.each(ROUTES)(
  '%s %s: 401 for strangers, 403 for other roles, neither for its own',
  async (method, path, allowed) => {
    for (const body of [undefined, {}]) {
      const stranger = await service.stranger()[method](at(path)).send(body);
      expect({ who: 'stranger', status: stranger.status, type: stranger.type }).toEqual({
        who: 'stranger',
        status: 401,
        type: 'application/problem+json',
      });
      for (const who of ALL) {
        const answer = await ask(people[who], method, path, body);
        const { status } = answer;
        if (allowed.includes(who)) {
          expect({ who, status }).not.toEqual({ who, status: 401 });
          // A steward may see what was handed in, but only its contributor changes it; that needs If-Match first.
          expect({ who, status }).not.toEqual({ who, status: 403 });
          expect(status).toBeLessThan(500);
        } else {
          expect({ who, status, code: answer.body.code }).toEqual({ who, status: 403, code: 'role-needed' });
        }
      }
    }
  },
);

test('no role sees a submission of somebody else before it was handed in, nor learns that it exists', async () => {
  const other = await signedInAs(service, 'scientist2');
  const path = at(`${SUBMISSIONS}/:submission`);
  const [theirs, none] = [
    await other.get(path).expect(404),
    await other.get(`${SUBMISSIONS}/none`).expect(404),
  ];
  const told = ({ body }: typeof theirs) => [body.code, body.title, body.status];
  expect(told(theirs)).toEqual(told(none));
});
