import { Injectable } from '@nestjs/common';
import { WriteQueue } from '../database/write-queue';
import { LedgerService } from '../ledger/ledger.service';
import { checksumOf } from './canonical';
import { VersionsService } from './versions.service';

/** Owner of what comes with the product: no person, so nobody can edit it as their own. */
export const SHIPPED = 'shipped';

export interface ShippedObject {
  kind: string;
  slug: string;
  title: string;
  content: unknown;
}

/**
 * Published tables that the product ships as versioned objects, so that estimates can pin them.
 * A release with other numbers adds a version; what pinned the older one keeps it.
 */
@Injectable()
export class ShippedObjects {
  constructor(
    private readonly versions: VersionsService,
    private readonly ledger: LedgerService,
    private readonly writes: WriteQueue,
  ) {}

  async ensure(shipped: ShippedObject[]): Promise<void> {
    for (const object of shipped) await this.ensureOne(object);
  }

  private async ensureOne({ kind, slug, title, content }: ShippedObject): Promise<void> {
    const known = await this.versions.objectBySlug(kind, slug);
    const latest = known && (await this.versions.latestPublished(known.id));
    if (latest && (latest.createdBy !== SHIPPED || latest.checksum === checksumOf(content))) return;
    await this.writes.run(async (transaction) => {
      const draft = known
        ? await this.versions.createVersion(known.id, { content, createdBy: SHIPPED }, transaction)
        : (await this.versions.createObject({ kind, slug, title, ownerId: SHIPPED, content }, transaction))
            .version;
      await this.versions.publish(draft.id, SHIPPED, transaction);
      await this.ledger.record(
        {
          actorId: null,
          verb: 'ship',
          objectKind: kind,
          objectId: draft.objectId,
          objectTitle: title,
          summary: `Version ${draft.number} of ${title} came with the product`,
        },
        transaction,
      );
    });
  }
}
