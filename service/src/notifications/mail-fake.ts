import type { AddressInfo } from 'node:net';
import { type BeforeApplicationShutdown, Injectable } from '@nestjs/common';
import { InjectModel } from '@nestjs/sequelize';
import { simpleParser } from 'mailparser';
import { SMTPServer, type SMTPServerDataStream, type SMTPServerSession } from 'smtp-server';
import { Settings } from '../config/settings';
import { WriteQueue } from '../database/write-queue';
import { MailboxRow } from './models/mailbox-row';

const MAX_BYTES = 1024 * 1024;

/** Demo only: a mail server on loopback that keeps what it gets for the Mailbox page and passes nothing on. */
@Injectable()
export class MailFake implements BeforeApplicationShutdown {
  private server: SMTPServer | undefined;

  constructor(
    @InjectModel(MailboxRow) private readonly rows: typeof MailboxRow,
    private readonly writes: WriteQueue,
    private readonly settings: Settings,
  ) {}

  /** @returns the port it listens on */
  async start(): Promise<number> {
    const server = new SMTPServer({
      authOptional: true,
      disabledCommands: ['AUTH', 'STARTTLS'],
      size: MAX_BYTES,
      onData: (stream, session, done) => {
        this.receive(stream, session).then(
          () => done(),
          (error: unknown) => done(error instanceof Error ? error : new Error(String(error))),
        );
      },
    });
    server.on('error', (error) =>
      this.settings.log({ event: 'mail-fake', level: 'warn', error: error.message }),
    );
    this.server = server;
    await new Promise<void>((resolve, reject) => {
      server.server.once('error', reject);
      server.listen(this.settings.mailFakePort, '127.0.0.1', () => resolve());
    });
    return (server.server.address() as AddressInfo).port;
  }

  async beforeApplicationShutdown(): Promise<void> {
    await new Promise<void>((resolve) => (this.server ? this.server.close(() => resolve()) : resolve()));
  }

  private async receive(stream: SMTPServerDataStream, session: SMTPServerSession): Promise<void> {
    const chunks: Buffer[] = [];
    for await (const chunk of stream as AsyncIterable<Buffer>) chunks.push(chunk);
    if (stream.sizeExceeded) throw new Error(`A mail may have ${MAX_BYTES} bytes at most.`);
    const raw = Buffer.concat(chunks);
    const mail = await simpleParser(raw);
    const rows = session.envelope.rcptTo.map(({ address }) => ({
      messageId: mail.messageId ?? '',
      fromAddress: mail.from?.text ?? '',
      toAddress: address.toLowerCase(),
      subject: mail.subject ?? '',
      text: mail.text ?? '',
      raw: raw.toString('utf8'),
    }));
    await this.writes.run((transaction) => this.rows.bulkCreate(rows, { transaction }));
  }
}
