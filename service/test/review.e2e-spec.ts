import { LedgerService } from '../src/ledger/ledger.service';
import type { SubmissionState } from '@siltlight/common/wire/submissions';
import { testAppWithPeople } from './support/demo-people';
import { answers } from './support/form';
import { mailsOf } from './support/mailed-links';
import { signedInAs, type SignedInCaller } from './support/sign-in';
import {
  approved,
  described,
  handedIn,
  REAL_EXPORT,
  sampleFile,
  SMALL_TABLE,
  Steps,
  SUBMISSIONS,
} from './support/submitting';
import type { TestApp } from './support/test-app';

let service: TestApp;
let scientist: SignedInCaller;
let steward: SignedInCaller;
/** steward and scientist */
let steward2: SignedInCaller;
beforeAll(async () => {
  service = await testAppWithPeople();
  scientist = await signedInAs(service, 'scientist');
  steward = await signedInAs(service, 'steward');
  steward2 = await signedInAs(service, 'steward2');
});
afterAll(() => service.close());

const ledger = () => service.app.get(LedgerService, { strict: false });
const RETURN = { decision: 'return', reason: 'Please answer the query.' };
const DECLINE = { decision: 'decline', reason: 'Already published elsewhere.' };
const APPROVE = { decision: 'approve' };

test('the queue is oldest first and holds what was handed in, not drafts', async () => {
  const [first, draft, second] = [
    await handedIn(scientist),
    await described(scientist),
    await handedIn(steward2),
  ];
  const { items } = (await steward.get(`${SUBMISSIONS}?queue=true&limit=200`).expect(200)).body;
  const ids: string[] = items.map(({ id }: { id: string }) => id);
  expect(ids.indexOf(first.detail.id)).toBeLessThan(ids.indexOf(second.detail.id));
  expect(ids).not.toContain(draft.detail.id);
  expect(items[0].counts).toMatchObject({ errors: 0, warnings: expect.any(Number) });
  const mine = (await steward2.get(`${SUBMISSIONS}?mine=true`).expect(200)).body.items;
  expect(mine.map(({ id }: { id: string }) => id)).toEqual([second.detail.id]);
});

test('four eyes: nobody vets or decides on a submission of their own, also as a steward', async () => {
  const own = await handedIn(steward2);
  await own.reload(steward2);
  expect(own.detail.rights).toMatchObject({ mayClaim: false, mayDecide: false });
  expect(own.detail.rights.whyNot).toMatch(/another steward/);
  const key = (await own.findings(steward2, 'severity=warning'))[0]?.key ?? 'V54||||uncertaintyMeaning||';
  const before = await ledger().count({});
  const acts: [string, object?][] = [
    ['claim'],
    ['waivers', { findingKeys: [key], reason: 'It is mine.' }],
    ['queries', { sheet: 'small', row: 3, column: 'F', text: 'Is this right?' }],
    ['decision', APPROVE],
    ['decision', RETURN],
    ['decision', DECLINE],
  ];
  for (const [act, body] of acts) {
    const refused = await own.call(steward2, act, body).expect(403);
    expect({ act, code: refused.body.code }).toEqual({ act, code: 'four-eyes' });
  }
  expect(await ledger().count({})).toBe(before);
  expect((await own.reload(steward2)).state).toBe('submitted');
  await own.waiveAll(steward);
  await own.post(steward, 'decision', APPROVE);
  expect(own.detail.state).toBe('approved');
});

test('a contributor edits only while it is with them, and a steward never', async () => {
  const steps = await handedIn(scientist);
  await scientist.put(`${steps.path}/metadata`, answers).set('If-Match', steps.tag).expect(409);
  await steps.post(steward, 'decision', RETURN);
  expect((await steps.call(steward, 'submit').expect(403)).body.code).toBe('not-yours');
  const edit = steward.put(`${steps.path}/metadata`, answers).set('If-Match', steps.tag);
  expect((await edit.expect(403)).body.code).toBe('not-yours');
  await steps.put(scientist, 'metadata', { ...answers, note: 'Answered.' });
  await steps.post(scientist, 'submit');
  expect(steps.detail).toMatchObject({ state: 'submitted', reviewer: null });
});

test('taking, letting go, asking, answering, returning and handing in anew, each told to the other side', async () => {
  const mails = mailsOf(service);
  const steps = await handedIn(scientist);
  const stewards = [steward.person.id, steward2.person.id].sort();
  expect(mails.map(({ toPersonId }) => toPersonId).sort()).toEqual(stewards);
  mails.length = 0;
  await steps.post(steward, 'claim');
  expect(steps.detail).toMatchObject({ state: 'in-review', reviewer: { name: 'Mirela Castag' } });
  for (const [act, body] of [
    ['decision', RETURN],
    ['queries', { sheet: 'small', row: 3, column: 'F', text: 'Is this right?' }],
  ] as const) {
    const refused = await steps.call(steward2, act, body).expect(409);
    expect(refused.body.code).toBe('in-review-with-another');
  }
  const query = { sheet: 'small', row: 3, column: 'F', text: 'Is this the mean of the bin?' };
  await steps.post(steward, 'queries', query);
  expect(steps.detail.queries).toMatchObject([{ ...query, by: { name: 'Mirela Castag' }, replies: [] }]);
  const answer = `queries/${steps.detail.queries[0]!.id}/replies`;
  await steps.post(scientist, answer, { text: 'It is one sample.' });
  await steps.post(steward, answer, { text: 'Then say so in the note.' });
  expect(mails.map(({ toPersonId, mailKind }) => [toPersonId, mailKind])).toEqual([
    [steward.person.id, 'query-answered'],
    [scientist.person.id, 'query-answered'],
  ]);
  await steps.call(scientist, 'queries/none/replies', { text: 'Hello?' }).expect(404);
  mails.length = 0;
  // Somebody who is away must not block it: another steward puts it back, and the reviewer is told.
  await steps.post(steward2, 'release');
  expect(steps.detail).toMatchObject({ state: 'submitted', reviewer: null });
  expect(mails).toMatchObject([{ toPersonId: steward.person.id, mailKind: 'submission-released' }]);
  await steps.post(steward2, 'claim');
  mails.length = 0;
  await steps.post(steward2, 'decision', RETURN);
  expect(mails).toMatchObject([{ toPersonId: scientist.person.id, mailKind: 'submission-returned' }]);
  expect(mails[0]!.lines.join(' ')).toContain(RETURN.reason);
  expect(steps.detail.queries[0]!.replies.map(({ text }) => text)).toHaveLength(2);
  await steps.put(scientist, 'metadata', { ...answers, note: 'One sample each.' });
  await steps.post(scientist, 'submit');
  await steps.post(steward, 'decision', DECLINE);
  expect(steps.detail.decisions.map(({ decision, by }) => [decision, by.name])).toEqual([
    ['return', 'Joren Quade'],
    ['decline', 'Mirela Castag'],
  ]);
  expect(steps.detail.dataset).toBeNull();
});

test('warnings are waived with a reason, errors and unknown findings never', async () => {
  const steps = await handedIn(scientist, sampleFile(REAL_EXPORT), REAL_EXPORT);
  const findings = await steps.findings(steward);
  const warning = findings.find(({ severity }) => severity === 'warning')!;
  const note = findings.find(({ severity }) => severity === 'note')!;
  for (const key of [note.key, 'V99||||||']) {
    const refused = await steps
      .call(steward, 'waivers', { findingKeys: [warning.key, key], reason: 'Looked at.' })
      .expect(422);
    expect(refused.body).toMatchObject({ code: 'not-waivable', errors: [{ pointer: '/findingKeys/1' }] });
  }
  await steps.call(steward, 'waivers', { findingKeys: [warning.key], reason: ' ' }).expect(422);
  const open = (await steps.reload(steward)).counts.openWarnings;
  await steps.post(steward, 'waivers', { findingKeys: [warning.key], reason: 'Stated in the paper.' });
  expect(steps.detail.counts.openWarnings).toBe(open - 1);
  const waived = (await steps.findings(scientist)).find(({ key }) => key === warning.key)!.waived;
  expect(waived).toMatchObject({ by: { name: 'Mirela Castag' }, reason: 'Stated in the paper.' });
});

test('nothing is approved while warnings stand, and no error can be handed in at all', async () => {
  const bad = `${SMALL_TABLE}Core KX-1,-41.27,172.64,abc,0.2,1.31,0.12,bulk\n`;
  const faulty = await described(scientist, bad, 'faulty.csv');
  expect(faulty.detail.counts.errors).toBeGreaterThan(0);
  expect((await faulty.call(scientist, 'submit').expect(422)).body.code).toBe('not-ready');

  const steps = await handedIn(scientist, sampleFile(REAL_EXPORT), REAL_EXPORT);
  expect(steps.detail.counts.openWarnings).toBeGreaterThan(0);
  const refused = await steps.call(steward, 'decision', APPROVE).expect(422);
  expect(refused.body.code).toBe('findings-stand');
  expect(refused.body.detail).toMatch(/open warnings/);
  expect((await steps.reload(steward)).state).toBe('submitted');
  const unknown = await steps.call(steward, 'decision', { ...APPROVE, datasetSlug: 'no-such-thing' });
  expect(unknown.status).toBe(422);
});

test('returning and declining want a reason, and a body cannot set what is not its own', async () => {
  const steps = await handedIn(scientist);
  for (const decision of ['return', 'decline']) {
    const refused = await steps.call(steward, 'decision', { decision }).expect(422);
    expect(refused.body.errors[0].pointer).toBe('/reason');
  }
  for (const extra of [{ reviewerId: scientist.person.id }, { state: 'approved' }, { checksum: 'x' }]) {
    await steps.call(steward, 'decision', { ...RETURN, ...extra }).expect(422);
  }
  await steps.call(steward, 'decision', { decision: 'publish' }).expect(422);
  await steps.call(steward, 'decision', {}).expect(422);
  expect((await steps.reload(steward)).decisions).toEqual([]);
});

describe('each step in each state', () => {
  const reach: Record<SubmissionState, () => Promise<Steps>> = {
    draft: () => described(scientist),
    submitted: () => handedIn(scientist),
    'in-review': () => then(handedIn(scientist), steward, 'claim'),
    returned: () => then(handedIn(scientist), steward, 'decision', RETURN),
    approved: () => approved(scientist, steward),
    declined: () => then(handedIn(scientist), steward, 'decision', DECLINE),
    withdrawn: () => then(handedIn(scientist), scientist, 'withdraw', { reason: 'Not yet.' }),
  };
  async function then(made: Promise<Steps>, by: SignedInCaller, act: string, body?: object): Promise<Steps> {
    const steps = await made;
    await steps.post(by, act, body);
    return steps;
  }
  const editing = ['draft', 'returned'];
  const vetting = ['submitted', 'in-review'];
  const rows = [{ sheet: 'small', row: 3 }];
  const steps: { step: string; by: () => SignedInCaller; body?: object; put?: boolean; allowed: string[] }[] =
    [
      { step: 'metadata', by: () => scientist, body: answers, put: true, allowed: editing },
      {
        step: 'corrections',
        by: () => scientist,
        body: { corrections: [{ sheet: 'small', row: 3, column: 'F', text: '0.43' }] },
        allowed: editing,
      },
      { step: 'leave-out', by: () => scientist, body: { rows, reason: 'Turbidite.' }, allowed: editing },
      { step: 'take-back', by: () => scientist, body: { rows }, allowed: editing },
      { step: 'submit', by: () => scientist, allowed: editing },
      {
        step: 'withdraw',
        by: () => scientist,
        body: { reason: 'Not yet.' },
        allowed: ['draft', 'submitted', 'returned'],
      },
      { step: 'claim', by: () => steward, allowed: ['submitted'] },
      { step: 'release', by: () => steward, allowed: ['in-review'] },
      {
        step: 'queries',
        by: () => steward,
        body: { sheet: 'small', row: 3, column: 'F', text: 'Is this right?' },
        allowed: vetting,
      },
      { step: 'decision', by: () => steward, body: RETURN, allowed: vetting },
      { step: 'decision', by: () => steward, body: DECLINE, allowed: vetting },
      { step: 'decision', by: () => steward, body: APPROVE, allowed: vetting },
    ];

  test.each(Object.keys(reach) as SubmissionState[])(
    '%s: what is allowed is done, everything else is refused with 409 and changes nothing',
    async (state) => {
      const closed = await reach[state]();
      expect(closed.detail.state).toBe(state);
      for (const { step, by, body, put, allowed } of steps) {
        if (allowed.includes(state)) continue;
        const before = await closed.reload(scientist);
        const call = put
          ? by().put(`${closed.path}/${step}`, body).set('If-Match', closed.tag)
          : closed.call(by(), step, body);
        const answer = await call;
        // To a steward a draft does not exist.
        const expected = state === 'draft' && by() === steward ? 404 : 409;
        expect({ step, body, status: answer.status }).toEqual({ step, body, status: expected });
        expect(await closed.reload(scientist)).toEqual(before);
      }
      for (const { step, by, body, put, allowed } of steps.filter(({ allowed }) => allowed.includes(state))) {
        const open = await reach[state]();
        if (body === APPROVE) await open.waiveAll(steward);
        const call = put
          ? by().put(`${open.path}/${step}`, body).set('If-Match', open.tag)
          : open.call(by(), step, body);
        expect({ step, allowed, status: (await call).status }).toEqual({ step, allowed, status: 200 });
      }
    },
  );
});

test('of two stewards who decide at once one wins: one version, one mail, one act each of twenty times', async () => {
  const other = steward2;
  const pairs: Steps[] = [];
  for (let count = 0; count < 20; count += 1) {
    const steps = await handedIn(scientist, SMALL_TABLE, `pair-${count}.csv`, {
      ...answers,
      title: `Pair ${count}`,
    });
    await steps.waiveAll(steward);
    pairs.push(steps);
  }
  const mails = mailsOf(service);
  const before = await ledger().count({});
  const outcomes = await Promise.all(
    pairs.flatMap((steps, index) => [
      steps.call(steward, 'decision', APPROVE),
      steps.call(other, 'decision', index % 2 ? APPROVE : DECLINE),
    ]),
  );
  for (let index = 0; index < pairs.length; index += 1) {
    const statuses = outcomes.slice(index * 2, index * 2 + 2).map(({ status }) => status);
    expect(statuses.filter((status) => status === 200)).toHaveLength(1);
    expect([409, 412]).toContain(statuses.find((status) => status !== 200));
    const detail = await pairs[index]!.reload(scientist);
    expect(detail.decisions).toHaveLength(1);
    expect(detail.dataset === null).toBe(detail.state === 'declined');
    if (detail.dataset) expect(detail.dataset.versionNumber).toBe(1);
    const acts = await ledger().find({ objectKind: 'submission', objectId: detail.id }, 50);
    expect(acts.filter(({ verb }) => /^(approve|decline)-/.test(verb))).toHaveLength(1);
  }
  expect(mails).toHaveLength(20);
  expect((await ledger().count({})) - before).toBe(20);
  expect(await ledger().verify()).toMatchObject({ intact: true });
});

test('each act leaves exactly one row in the ledger, a refused one none', async () => {
  const acts: [string, () => Promise<unknown>][] = [];
  const steps = await described(scientist, sampleFile(REAL_EXPORT), REAL_EXPORT);
  const rows = [{ sheet: 'B_Staubfluesse_Export', row: 6 }];
  acts.push(
    ['mapping', () => steps.put(scientist, 'mapping', steps.detail.mapping)],
    ['leave-out', () => steps.post(scientist, 'leave-out', { rows, reason: 'Too few samples.' })],
    ['submit', () => steps.post(scientist, 'submit')],
    ['claim', () => steps.post(steward, 'claim')],
    ['waivers', () => steps.waiveAll(steward)],
    ['stale', () => scientist.post(`${steps.path}/withdraw`, { reason: 'late' }).set('If-Match', '"1"')],
    ['decision', () => steps.post(steward, 'decision', APPROVE)],
  );
  for (const [act, run] of acts) {
    const before = await ledger().count({});
    await run();
    expect({ act, rows: (await ledger().count({})) - before }).toEqual({
      act,
      rows: act === 'stale' ? 0 : 1,
    });
  }
  const [last] = await ledger().find({ objectId: steps.detail.id }, 1);
  expect(JSON.parse(last!.after!)).toMatchObject({
    decision: 'approve',
    dataset: { number: 1, checksum: expect.stringMatching(/^[0-9a-f]{64}$/) },
  });
});
