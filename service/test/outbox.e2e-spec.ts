import * as net from 'node:net';
import type { AddressInfo } from 'node:net';
import { SMTPServer, type SMTPServerOptions } from 'smtp-server';
import { WriteQueue } from '../src/database/write-queue';
import { MailboxRow } from '../src/notifications/models/mailbox-row';
import { OutboxRow } from '../src/notifications/models/outbox-row';
import { OutboxSender } from '../src/notifications/outbox-sender';
import { type Mail, OutboxService } from '../src/notifications/outbox.service';
import { signedInAs } from './support/sign-in';
import { testAppWithPeople } from './support/demo-people';
import { testApp, type TestApp } from './support/test-app';

const open: (() => Promise<unknown>)[] = [];
afterEach(async () => {
  for (const close of open.splice(0).reverse()) await close();
});

async function start(smtpPort?: number): Promise<TestApp> {
  const variables = smtpPort
    ? { SILTLIGHT_SMTP_HOST: '127.0.0.1', SILTLIGHT_SMTP_PORT: String(smtpPort) }
    : undefined;
  // The rest of the scenario hands things over, too: its mails would stand among those that are looked at here.
  const service = await testAppWithPeople([], variables ? { variables } : {});
  open.push(service.close);
  return service;
}

async function smtp(options: SMTPServerOptions): Promise<number> {
  const server = new SMTPServer({ authOptional: true, disabledCommands: ['AUTH', 'STARTTLS'], ...options });
  await new Promise<void>((resolve) => server.listen(0, '127.0.0.1', () => resolve()));
  open.push(() => new Promise<void>((resolve) => server.close(() => resolve())));
  return (server.server.address() as AddressInfo).port;
}

const personId = async (service: TestApp) => (await signedInAs(service, 'scientist')).person.id;

async function queue(service: TestApp, mail: Partial<Mail> = {}): Promise<void> {
  const toPersonId = await personId(service);
  const whole = {
    toPersonId,
    mailKind: 'test',
    subject: 'Approved',
    lines: ['Your dataset was approved.'],
    ...mail,
  };
  await service.app
    .get(WriteQueue)
    .run((transaction) => service.app.get(OutboxService).queue(whole, transaction));
  await service.app.get(OutboxSender).settled();
}

describe('in the demo', () => {
  test('mail reaches the mailbox of its person, with a link to the configured address', async () => {
    const service = await start();
    await queue(service, { linkPath: '/datasets/7' });
    const scientist = await signedInAs(service, 'scientist');
    const list = await scientist.get('/api/v1/mailbox').expect(200);
    expect(list.body).toMatchObject({
      total: 1,
      items: [{ subject: 'Approved', to: 'scientist@siltlight.example' }],
    });
    const { id, messageId } = list.body.items[0];
    const mail = await scientist.get(`/api/v1/mailbox/${id}`).expect(200);
    expect(mail.body.text).toContain('Your dataset was approved.');
    expect(mail.body.text).toContain('http://127.0.0.1:3000/datasets/7');
    expect((await OutboxRow.findOne())!).toMatchObject({ state: 'sent', attempts: 1, messageId });

    const other = await signedInAs(service, 'scientist2');
    expect((await other.get('/api/v1/mailbox').expect(200)).body.total).toBe(0);
    await other.get(`/api/v1/mailbox/${id}`).expect(404);
    const admin = await signedInAs(service, 'admin');
    expect((await admin.get('/api/v1/mailbox').expect(200)).body.total).toBe(1);
    await admin.get(`/api/v1/mailbox/${id}`).expect(200);
    await service.stranger().get('/api/v1/mailbox').expect(401);
  });

  test('a title cannot add a header, a recipient or a hidden direction', async () => {
    const service = await start();
    const evil = 'Dust\r\nBcc: victim@example.org\u0000\r\n\r\nbody \u202egnirts';
    await queue(service, { subject: evil, lines: [evil, 'x'.repeat(10_000)] });
    const rows = await MailboxRow.findAll();
    expect(rows.map((row) => row.toAddress)).toEqual(['scientist@siltlight.example']);
    const [head] = rows[0]!.raw.split('\r\n\r\n');
    expect(head).not.toMatch(/^bcc:/im);
    expect(rows[0]!.subject).toBe('Dust Bcc: victim@example.org body gnirts');
    for (const hidden of ['\0', '\u202e']) expect(rows[0]!.text).not.toContain(hidden);
  });

  test('mail of a write that fails is never sent', async () => {
    const service = await start();
    const toPersonId = await personId(service);
    const failing = service.app.get(WriteQueue).run(async (transaction) => {
      const mail = { toPersonId, mailKind: 'test', subject: 'Never', lines: [] };
      await service.app.get(OutboxService).queue(mail, transaction);
      throw new Error('the decision failed');
    });
    await expect(failing).rejects.toThrow('the decision failed');
    await service.app.get(OutboxSender).settled();
    expect([await OutboxRow.count(), await MailboxRow.count()]).toEqual([0, 0]);
  });
});

test('outside the demo there is no mailbox, and mail waits until a server is configured', async () => {
  const service = await testApp({ variables: { SILTLIGHT_DEMO: '0', SILTLIGHT_SECRET: 's'.repeat(32) } });
  open.push(service.close);
  await service.http.get('/api/v1/mailbox').expect(401);
  await service.http.get('/api/health/ready').expect(200);
});

describe('a mail server that', () => {
  test('is absent delays the mail, with a growing wait', async () => {
    const free = net.createServer().listen(0, '127.0.0.1');
    await new Promise((resolve) => free.once('listening', resolve));
    const { port } = free.address() as AddressInfo;
    await new Promise((resolve) => free.close(resolve));
    const service = await start(port);
    await queue(service);
    const mail = (await OutboxRow.findOne())!;
    expect(mail).toMatchObject({
      state: 'waiting',
      attempts: 1,
      lastError: expect.stringContaining('ECONNREFUSED'),
    });
    const waitMs = Date.parse(mail.nextAttemptAt) - Date.now();
    expect(waitMs).toBeGreaterThan(15_000);
    expect(waitMs).toBeLessThan(36_001);
  });

  test('refuses for now (451) is asked again; one that refuses for good (550) is not', async () => {
    const refusing = (responseCode: number) =>
      smtp({
        onRcptTo: (_address, _session, done) => done(Object.assign(new Error('refused'), { responseCode })),
      });
    const later = await start(await refusing(451));
    await queue(later);
    expect(await OutboxRow.findOne()).toMatchObject({ state: 'waiting', attempts: 1 });
    const never = await start(await refusing(550));
    await queue(never);
    expect(await OutboxRow.findOne()).toMatchObject({ state: 'failed', attempts: 1 });
    expect(never.logged).toContainEqual(expect.objectContaining({ event: 'mail-failed' }));

    const admin = await signedInAs(never, 'admin');
    const failed = await admin.get('/api/v1/outbox?state=failed').expect(200);
    expect(failed.body).toMatchObject({ total: 1, items: [{ state: 'failed', nextAttemptAt: null }] });
    const again = `/api/v1/outbox/${failed.body.items[0].id}/send-again`;
    await (await signedInAs(never, 'steward')).post(again).expect(403);
    expect((await admin.post(again).expect(200)).body).toMatchObject({ state: 'waiting', attempts: 0 });
    await never.app.get(OutboxSender).settled();
    expect((await admin.get('/api/v1/outbox?state=failed').expect(200)).body.items[0].attempts).toBe(1);
  });

  test('breaks off after the data gets the mail again, under the same Message-ID', async () => {
    const received: string[] = [];
    const port = await smtp({
      onData: (stream, session, done) => {
        let text = '';
        stream.on('data', (chunk: Buffer) => (text += chunk.toString()));
        stream.on('end', () => {
          received.push(/^message-id: (.*)$/im.exec(text)![1]!.trim());
          if (received.length === 1) done(Object.assign(new Error('broken off'), { responseCode: 421 }));
          else done();
        });
      },
    });
    const service = await start(port);
    await queue(service);
    await service.app
      .get(WriteQueue)
      .run((transaction) =>
        OutboxRow.update({ nextAttemptAt: new Date(0).toISOString() }, { where: {}, transaction }),
      );
    service.app.get(OutboxSender).wake();
    await service.app.get(OutboxSender).settled();
    expect(await OutboxRow.findOne()).toMatchObject({ state: 'sent', attempts: 2 });
    expect(received).toHaveLength(2);
    expect(received[0]).toBe(received[1]);
  });
});
