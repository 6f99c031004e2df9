import { Injectable, type OnModuleInit } from '@nestjs/common';
import { DatasetDependants } from '../datasets/dataset-dependants';
import { FieldsService } from '../fields/fields.service';
import { VersionsService } from '../versions/versions.service';
import { EstimateViews } from './estimate-views.service';

/** Tells Holdings which estimates rest, through their field, on a dataset version. */
@Injectable()
export class EstimateDependants implements OnModuleInit {
  constructor(
    private readonly dependants: DatasetDependants,
    private readonly fields: FieldsService,
    private readonly views: EstimateViews,
    private readonly versions: VersionsService,
  ) {}

  onModuleInit(): void {
    this.dependants.register({
      usedBy: async (versionId) => {
        const runs = await this.resting(versionId);
        return runs.map(({ run, version }) => ({
          kind: 'estimate' as const,
          id: run.id,
          title: `${run.title}, run ${run.runNumber}`,
          stale: (version?.staleSince ?? null) !== null,
        }));
      },
      markStale: async (versionId, reason, transaction) => {
        const runs = await this.resting(versionId);
        await this.versions.markStale(
          runs.flatMap(({ version }) => version?.id ?? []),
          reason,
          transaction,
        );
      },
    });
  }

  private async resting(datasetVersionId: string) {
    const fields = await this.fields.using(datasetVersionId);
    return this.views.ofFields(fields.map(({ id }) => id));
  }
}
