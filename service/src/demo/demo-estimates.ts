import { Injectable } from '@nestjs/common';
import type { EstimateRequest } from '@siltlight/common/wire/estimates';
import type { Person } from '../auth/policy';
import { BackdropsService } from '../backdrops/backdrops.service';
import { DatasetsService } from '../datasets/datasets.service';
import { EstimatesService } from '../estimates/estimates.service';
import { EstimateViews } from '../estimates/estimate-views.service';
import { SignOff } from '../estimates/sign-off.service';
import { FieldsService } from '../fields/fields.service';
import { OpticalSetsService } from '../optics/optical-sets.service';

/** Slices that the invented records cover, so that the first screen shows a column with colours. */
const SLICES = ['mid-holocene', 'heinrich-stadial-1', 'lgm', 'mis-2'] as const;

@Injectable()
export class DemoEstimates {
  constructor(
    private readonly datasets: DatasetsService,
    private readonly fields: FieldsService,
    private readonly sets: OpticalSetsService,
    private readonly backdrops: BackdropsService,
    private readonly estimates: EstimatesService,
    private readonly views: EstimateViews,
    private readonly signOff: SignOff,
  ) {}

  async make(author: Person, signer: Person): Promise<void> {
    const datasetVersionIds = (await this.datasets.list()).map(({ latest }) => latest.versionId);
    for (const sliceSlug of SLICES) {
      const done = await this.views.newest({ sliceSlug }, author);
      if (done.some(({ state }) => state === 'published')) continue;
      const field = await this.fields.build(
        { sliceSlug, way: 'regional-scaling', datasetVersionIds },
        author,
      );
      const id = await this.estimates.runNow(await this.request(field.versionId), author);
      await this.signOff.sign(id, signer);
    }
  }

  private async request(fieldVersionId: string): Promise<EstimateRequest> {
    const [sets, backdrops] = await Promise.all([this.sets.list(), this.backdrops.list()]);
    return {
      fieldVersionId,
      opticalSetVersionId: sets.find(({ slug }) => slug === 'dust-broadband')!.versionId,
      backdropVersionId: backdrops[0]!.versionId,
      method: 'thin-layer-daily',
      transmittance: 0.76,
      longwave: { on: true, efficiencyWm2: 8 },
      members: 512,
      seed: 20417,
    };
  }
}
