import { Injectable } from '@nestjs/common';
import { InjectModel } from '@nestjs/sequelize';
import type { VersionState } from '@siltlight/common/wire/shared';
import { Op, type Transaction, type WhereOptions } from 'sequelize';
import { nowIso } from '../database/row';
import { notFound, problem } from '../http/problem';
import { canonicalJson, sha256 } from './canonical';
import { ObjectRow } from './models/object-row';
import { VersionRow } from './models/version-row';
import { freeSlug } from './slug';
import {
  objectOf,
  summaryOf,
  type Version,
  type VersionedObject,
  type VersionSummary,
  versionOf,
} from './version';

export interface VersionFilter {
  ids?: string[];
  states?: VersionState[];
  objectIds?: string[];
  ownerId?: string;
  slug?: string;
  stale?: boolean;
  /** id of the version after which to go on: the order is that of creation */
  after?: string;
  limit?: number;
}

const LIST_LIMIT = 1000;

/**
 * Versioned objects of every kind: draft, published, superseded, withdrawn. Each act of a feature calls this
 * inside its own write, beside the ledger row; the triggers of the database hold what is promised here.
 */
@Injectable()
export class VersionsService {
  constructor(
    @InjectModel(ObjectRow) private readonly objects: typeof ObjectRow,
    @InjectModel(VersionRow) private readonly versions: typeof VersionRow,
  ) {}

  async createObject<Content>(
    given: { kind: string; slug?: string; title: string; ownerId: string; content: Content; note?: string },
    transaction: Transaction,
  ): Promise<{ object: VersionedObject; version: Version<Content> }> {
    const { kind, title, ownerId, content, note } = given;
    const slug = given.slug ?? (await freeSlug(this.objects, kind, title, transaction));
    const object = await this.objects.create({ kind, slug, title, ownerId }, { transaction });
    const version = await this.createVersion(
      object.id,
      { content, createdBy: ownerId, ...(note ? { note } : {}) },
      transaction,
    );
    return { object: objectOf(object), version };
  }

  async createVersion<Content>(
    objectId: string,
    given: { content: Content; createdBy: string; note?: string },
    transaction: Transaction,
  ): Promise<Version<Content>> {
    const last = await this.versions.max<number | null, VersionRow>('number', {
      where: { objectId },
      transaction,
    });
    const { createdBy, note } = given;
    const row = await this.versions.create(
      {
        objectId,
        number: (last ?? 0) + 1,
        state: 'draft',
        ...stored(given.content),
        note: note ?? null,
        createdBy,
      },
      { transaction },
    );
    return this.get<Content>(row.id, transaction);
  }

  async saveDraft<Content>(
    versionId: string,
    content: Content,
    transaction: Transaction,
  ): Promise<Version<Content>> {
    const row = await this.row(versionId, transaction);
    requireState(row, ['draft'], 'Only a draft can be changed; make a new version instead.');
    await row.update(stored(content), { transaction });
    return versionOf<Content>(row);
  }

  /** The version that was published before becomes superseded: of one object at most one is in force. */
  async publish<Content>(
    versionId: string,
    byPersonId: string,
    transaction: Transaction,
  ): Promise<Version<Content>> {
    const row = await this.row(versionId, transaction);
    requireState(row, ['draft'], 'Only a draft can be published.');
    await this.versions.update(
      { state: 'superseded', supersededByVersionId: row.id },
      { where: { objectId: row.objectId, state: 'published' }, transaction },
    );
    await row.update({ state: 'published', publishedBy: byPersonId, publishedAt: nowIso() }, { transaction });
    return versionOf<Content>(row);
  }

  /** Stays readable for ever, with the reason beside it. */
  async withdraw(
    versionId: string,
    _byPersonId: string,
    reason: string,
    transaction: Transaction,
  ): Promise<VersionSummary> {
    const row = await this.row(versionId, transaction);
    requireState(row, ['published', 'superseded'], 'Only what was published can be withdrawn.');
    await row.update({ state: 'withdrawn', withdrawnReason: reason }, { transaction });
    return summaryOf(row);
  }

  /** What was computed from something that has changed since; the first reason stays. */
  async markStale(versionIds: string[], reason: string, transaction: Transaction): Promise<void> {
    await this.versions.update(
      { staleSince: nowIso(), staleReason: reason },
      { where: { id: versionIds, staleSince: null }, transaction },
    );
  }

  async get<Content = unknown>(versionId: string, transaction?: Transaction): Promise<Version<Content>> {
    return versionOf<Content>(await this.row(versionId, transaction));
  }

  async latestPublished<Content = unknown>(
    objectId: string,
    transaction?: Transaction,
  ): Promise<Version<Content> | null> {
    const where = { objectId, state: 'published' };
    const row = await this.versions.findOne({ where, include: ObjectRow, ...inside(transaction) });
    return row && versionOf<Content>(row);
  }

  async object(objectId: string, transaction?: Transaction): Promise<VersionedObject> {
    const row = await this.objects.findByPk(objectId, inside(transaction));
    if (!row) throw notFound('Object', objectId);
    return objectOf(row);
  }

  async objectBySlug(kind: string, slug: string, transaction?: Transaction): Promise<VersionedObject | null> {
    const row = await this.objects.findOne({ where: { kind, slug }, ...inside(transaction) });
    return row && objectOf(row);
  }

  /** Without contents, oldest first. */
  async list(kind: string, filter: VersionFilter = {}, transaction?: Transaction): Promise<VersionSummary[]> {
    const rows = await this.versions.findAll({
      ...selection(kind, filter),
      attributes: { exclude: ['content'] },
      order: [['id', 'ASC']],
      limit: filter.limit ?? LIST_LIMIT,
      ...inside(transaction),
    });
    return rows.map(summaryOf);
  }

  count(kind: string, filter: VersionFilter = {}): Promise<number> {
    return this.versions.count(selection(kind, filter));
  }

  private async row(versionId: string, transaction?: Transaction): Promise<VersionRow> {
    const row = await this.versions.findByPk(versionId, { include: ObjectRow, ...inside(transaction) });
    if (!row) throw notFound('Version', versionId);
    return row;
  }
}

function stored(content: unknown): { content: string; checksum: string } {
  const text = canonicalJson(content);
  return { content: text, checksum: sha256(text) };
}

function inside(transaction: Transaction | undefined): { transaction?: Transaction } {
  return transaction ? { transaction } : {};
}

function selection(kind: string, filter: VersionFilter) {
  const { ids, states, objectIds, ownerId, slug, stale, after } = filter;
  const where: WhereOptions = {
    ...(states ? { state: states } : {}),
    ...(objectIds ? { objectId: objectIds } : {}),
    ...(ids || after
      ? { id: { ...(ids ? { [Op.in]: ids } : {}), ...(after ? { [Op.gt]: after } : {}) } }
      : {}),
    ...(stale === undefined ? {} : { staleSince: stale ? { [Op.ne]: null } : null }),
  };
  const objectWhere = { kind, ...(ownerId ? { ownerId } : {}), ...(slug ? { slug } : {}) };
  return { where, include: [{ model: ObjectRow, where: objectWhere }] };
}

function requireState(row: VersionRow, allowed: VersionState[], remedy: string): void {
  if (allowed.includes(row.state)) return;
  throw problem(
    409,
    'wrong-state',
    'The version is no longer in that state',
    `Version ${row.number} is ${row.state}. ${remedy}`,
  );
}
