import { Injectable } from '@nestjs/common';
import { InjectModel } from '@nestjs/sequelize';
import { Op, type Transaction } from 'sequelize';
import { Settings } from '../config/settings';
import { newId, nowIso } from '../database/row';
import { WriteQueue } from '../database/write-queue';
import { notFound, problem } from '../http/problem';
import { LedgerService } from '../ledger/ledger.service';
import { PeopleService } from '../users/people.service';
import { bodyOf, oneLine, subjectOf } from './mail-text';
import { OutboxRow } from './models/outbox-row';
import { OutboxSender } from './outbox-sender';

export interface Mail {
  toPersonId: string;
  /** steady name of the occasion, e.g. submission-approved */
  mailKind: string;
  subject: string;
  /** paragraphs; plain text */
  lines: string[];
  /** path in the client, e.g. /datasets/… ; made an address with the configured public URL */
  linkPath?: string;
}

/** Mail is part of the write that causes it: it cannot be lost, and a dead mail server delays nothing. */
@Injectable()
export class OutboxService {
  constructor(
    @InjectModel(OutboxRow) private readonly rows: typeof OutboxRow,
    private readonly people: PeopleService,
    private readonly sender: OutboxSender,
    private readonly settings: Settings,
    private readonly writes: WriteQueue,
    private readonly ledger: LedgerService,
  ) {}

  async queue(mail: Mail, transaction: Transaction): Promise<void> {
    const person = await this.people.byId(mail.toPersonId, transaction);
    if (!person)
      throw new Error(`Mail ${mail.mailKind} is for a person who does not exist: ${mail.toPersonId}.`);
    const id = newId();
    const link = mail.linkPath ? `${this.settings.publicUrl}${mail.linkPath}` : undefined;
    await this.rows.create(
      {
        id,
        toPersonId: person.id,
        toName: oneLine(person.name, 120),
        toAddress: person.email,
        mailKind: mail.mailKind,
        subject: subjectOf(mail.subject),
        body: bodyOf(person.name, mail.lines, link),
        messageId: `<${id}@${new URL(this.settings.publicUrl).hostname}>`,
        state: 'waiting',
        nextAttemptAt: nowIso(),
      },
      { transaction },
    );
    transaction.afterCommit(() => this.sender.wake());
  }

  find(state: OutboxRow['state'] | undefined, count: number, after?: string): Promise<OutboxRow[]> {
    const where = { ...(state ? { state } : {}), ...(after ? { id: { [Op.lt]: after } } : {}) };
    return this.rows.findAll({ where, order: [['id', 'DESC']], limit: count });
  }

  count(state: OutboxRow['state'] | undefined): Promise<number> {
    return this.rows.count({ where: state ? { state } : {} });
  }

  sendAgain(id: string, actorId: string): Promise<OutboxRow> {
    return this.writes.run(async (transaction) => {
      const row = await this.rows.findByPk(id, { transaction });
      if (!row) throw notFound('Mail', id);
      if (row.state !== 'failed') {
        throw problem(
          409,
          'mail-not-failed',
          'Only a failed mail can be sent again',
          `This one is ${row.state}.`,
        );
      }
      await row.update({ state: 'waiting', attempts: 0, nextAttemptAt: nowIso() }, { transaction });
      const act = {
        actorId,
        verb: 'send-mail-again',
        objectKind: 'mail',
        objectId: id,
        objectTitle: row.subject,
      };
      await this.ledger.record(
        { ...act, summary: `Had the failed mail "${row.subject}" sent again` },
        transaction,
      );
      transaction.afterCommit(() => this.sender.wake());
      return row;
    });
  }
}
