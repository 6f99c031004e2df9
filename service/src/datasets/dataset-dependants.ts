import { Injectable } from '@nestjs/common';
import type { Transaction } from 'sequelize';

export interface Dependant {
  kind: 'field' | 'estimate';
  id: string;
  title: string;
  stale: boolean;
}

/** What a later feature knows of its use of dataset versions. */
export interface DependantsSource {
  usedBy: (versionId: string) => Promise<Dependant[]>;
  /** called in the transaction in which the version is superseded or withdrawn */
  markStale: (versionId: string, reason: string, transaction: Transaction) => Promise<void>;
}

/** Later features tell here how to find what rests on a dataset version: this feature comes before them in the story. */
@Injectable()
export class DatasetDependants {
  private readonly sources: DependantsSource[] = [];

  register(source: DependantsSource): void {
    this.sources.push(source);
  }

  async usedBy(versionId: string): Promise<Dependant[]> {
    return (await Promise.all(this.sources.map((source) => source.usedBy(versionId)))).flat();
  }

  async markStale(versionId: string, reason: string, transaction: Transaction): Promise<void> {
    for (const source of this.sources) await source.markStale(versionId, reason, transaction);
  }
}
