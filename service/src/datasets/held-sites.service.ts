import { Injectable } from '@nestjs/common';
import { quantile } from '@siltlight/common/statistics/quantile';
import type { HeldSample, HeldSite } from '@siltlight/common/vetting/context';
import { VersionsService } from '../versions/versions.service';
import { DATASET, type DatasetContent, type DatasetSample } from './dataset-content';

export interface Held {
  sites: HeldSite[];
  samples: HeldSample[];
}

/** What Holdings have already, for checks of what comes in against what is there. */
@Injectable()
export class HeldSites {
  private known: { mark: string; held: Held } | undefined;

  constructor(private readonly versions: VersionsService) {}

  async all(): Promise<Held> {
    const published = await this.versions.list(DATASET, { states: ['published'] });
    const mark = published.map(({ id }) => id).join(' ');
    if (this.known?.mark !== mark) {
      const parts = await Promise.all(published.map(({ id }) => this.ofVersion(id)));
      const held = {
        sites: parts.flatMap(({ sites }) => sites),
        samples: parts.flatMap(({ samples }) => samples),
      };
      this.known = { mark, held };
    }
    return this.known.held;
  }

  private async ofVersion(versionId: string): Promise<Held> {
    const { content, object } = await this.versions.get<DatasetContent>(versionId);
    const datasetTitle = object.title;
    const archive = content.metadata.archive ?? null;
    return {
      sites: [...bySite(content.samples).values()].map((samples) => siteOf(samples, datasetTitle, archive)),
      samples: content.samples.map((sample) => heldSample(sample, datasetTitle)),
    };
  }
}

function bySite(samples: readonly DatasetSample[]): Map<string, DatasetSample[]> {
  const sites = new Map<string, DatasetSample[]>();
  for (const sample of samples) {
    const known = sites.get(sample.site);
    if (known) known.push(sample);
    else sites.set(sample.site, [sample]);
  }
  return sites;
}

function siteOf(samples: DatasetSample[], datasetTitle: string, archive: string | null): HeldSite {
  const { site, latitudeDeg, longitudeDeg } = samples[0]!;
  const fluxes = samples.filter(({ quantity }) => quantity === 'dust').map(({ fluxGM2Yr }) => fluxGM2Yr);
  const medianFluxGM2Yr = fluxes.length === 0 ? null : quantile(fluxes, 0.5);
  return { site, latitudeDeg, longitudeDeg, datasetTitle, archive, medianFluxGM2Yr };
}

function heldSample(sample: DatasetSample, datasetTitle: string): HeldSample {
  const { site, latitudeDeg, longitudeDeg, quantity, sizeCutoff, ageKaBp, fluxGM2Yr } = sample;
  return { site, latitudeDeg, longitudeDeg, datasetTitle, quantity, sizeCutoff, ageKaBp, fluxGM2Yr };
}
