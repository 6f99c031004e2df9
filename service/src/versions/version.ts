import type { VersionState } from '@siltlight/common/wire/shared';
import type { ObjectRow } from './models/object-row';
import type { VersionRow } from './models/version-row';

export interface VersionedObject {
  id: string;
  kind: string;
  slug: string;
  title: string;
  ownerId: string;
  createdAt: string;
}

/** A version without its content, which may be large. */
export interface VersionSummary {
  id: string;
  objectId: string;
  number: number;
  state: VersionState;
  checksum: string;
  note: string | null;
  createdBy: string;
  createdAt: string;
  publishedBy: string | null;
  publishedAt: string | null;
  withdrawnReason: string | null;
  supersededByVersionId: string | null;
  staleSince: string | null;
  staleReason: string | null;
  object: VersionedObject;
}

export interface Version<Content = unknown> extends VersionSummary {
  content: Content;
}

export function objectOf(row: ObjectRow): VersionedObject {
  const { id, kind, slug, title, ownerId, createdAt } = row;
  return { id, kind, slug, title, ownerId, createdAt };
}

export function summaryOf(row: VersionRow): VersionSummary {
  return {
    id: row.id,
    objectId: row.objectId,
    number: row.number,
    state: row.state,
    checksum: row.checksum,
    note: row.note ?? null,
    createdBy: row.createdBy,
    createdAt: row.createdAt,
    publishedBy: row.publishedBy ?? null,
    publishedAt: row.publishedAt ?? null,
    withdrawnReason: row.withdrawnReason ?? null,
    supersededByVersionId: row.supersededByVersionId ?? null,
    staleSince: row.staleSince ?? null,
    staleReason: row.staleReason ?? null,
    object: objectOf(row.object),
  };
}

/** The content's shape is known to the feature that wrote it. */
export function versionOf<Content>(row: VersionRow): Version<Content> {
  return { ...summaryOf(row), content: JSON.parse(row.content) as Content };
}
