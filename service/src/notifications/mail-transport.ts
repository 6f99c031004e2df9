import { Injectable, type OnModuleInit } from '@nestjs/common';
import { createTransport, type Transporter } from 'nodemailer';
import { Settings } from '../config/settings';
import { MailFake } from './mail-fake';
import { htmlOf } from './mail-text';
import type { OutboxRow } from './models/outbox-row';

const CONNECT_WITHIN_MS = 10_000;
const ANSWER_WITHIN_MS = 20_000;

/** The way to the configured mail server, or to the loopback fake of the demo, or none. */
@Injectable()
export class MailTransport implements OnModuleInit {
  private transporter: Transporter | undefined;

  constructor(
    private readonly settings: Settings,
    private readonly fake: MailFake,
  ) {}

  async onModuleInit(): Promise<void> {
    const { smtp, demo } = this.settings;
    if (smtp) {
      const auth = smtp.user ? { auth: { user: smtp.user, pass: smtp.password ?? '' } } : {};
      this.transporter = this.open({ host: smtp.host, port: smtp.port, secure: smtp.port === 465, ...auth });
    } else if (demo) {
      const port = await this.fake.start();
      this.transporter = this.open({ host: '127.0.0.1', port, secure: false, ignoreTLS: true });
    }
  }

  get exists(): boolean {
    return this.transporter !== undefined;
  }

  async send(mail: OutboxRow): Promise<void> {
    if (!this.transporter) throw new Error('No mail server is configured.');
    await this.transporter.sendMail({
      from: this.settings.mailFrom,
      // As an object: a name with commas or angle brackets cannot become a second recipient.
      to: { name: mail.toName, address: mail.toAddress },
      subject: mail.subject,
      text: mail.body,
      html: htmlOf(mail.body),
      messageId: mail.messageId,
      headers: { 'Auto-Submitted': 'auto-generated' },
    });
  }

  close(): void {
    this.transporter?.close();
  }

  private open(server: { host: string; port: number; secure: boolean; ignoreTLS?: boolean }): Transporter {
    return createTransport({
      ...server,
      connectionTimeout: CONNECT_WITHIN_MS,
      greetingTimeout: CONNECT_WITHIN_MS,
      socketTimeout: ANSWER_WITHIN_MS,
      disableFileAccess: true,
      disableUrlAccess: true,
    });
  }
}
