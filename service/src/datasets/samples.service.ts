import { Injectable } from '@nestjs/common';
import { InjectModel } from '@nestjs/sequelize';
import { regionAt } from '@siltlight/common/sphere/region-set';
import type { SampleView } from '@siltlight/common/wire/datasets';
import { col, fn, type Transaction } from 'sequelize';
import type { DatasetSample } from './dataset-content';
import { SampleRow } from './models/sample-row';

export interface SiteSummary {
  site: string;
  latitudeDeg: number;
  longitudeDeg: number;
  regionCode: string | null;
  sampleCount: number;
  youngestKaBp: number;
  oldestKaBp: number;
}

/** Rows a statement: SQLite takes 32,766 values at once, and a row has 20. */
const CHUNK = 1000;

/** The samples of dataset versions, stored once and only read afterwards. */
@Injectable()
export class SamplesService {
  constructor(@InjectModel(SampleRow) private readonly samples: typeof SampleRow) {}

  async store(versionId: string, samples: DatasetSample[], transaction: Transaction): Promise<void> {
    for (let start = 0; start < samples.length; start += CHUNK) {
      const rows = samples.slice(start, start + CHUNK).map((sample, index) => ({
        ...sample,
        versionId,
        position: start + index,
        regionCode: regionAt(sample.longitudeDeg, sample.latitudeDeg),
      }));
      await this.samples.bulkCreate(rows, { transaction });
    }
  }

  count(versionId: string): Promise<number> {
    return this.samples.count({ where: { versionId } });
  }

  async page(versionId: string, query: { site?: string | undefined; offset: number; limit: number }) {
    const where = { versionId, ...(query.site === undefined ? {} : { site: query.site }) };
    const { rows, count } = await this.samples.findAndCountAll({
      where,
      order: [['position', 'ASC']],
      offset: query.offset,
      limit: query.limit,
    });
    return { total: count, items: rows.map(viewOf) };
  }

  /** All samples of some versions, for the averaging over a slice; optionally of one site. */
  async ofVersions(
    versionIds: string[],
    site?: string,
  ): Promise<(SampleView & { versionId: string; regionCode: string | null })[]> {
    const where = { versionId: versionIds, ...(site === undefined ? {} : { site }) };
    const rows = await this.samples.findAll({
      where,
      order: [
        ['versionId', 'ASC'],
        ['position', 'ASC'],
      ],
    });
    return rows.map((row) => ({
      ...viewOf(row),
      versionId: row.versionId,
      regionCode: row.regionCode ?? null,
    }));
  }

  async sites(versionId: string): Promise<SiteSummary[]> {
    const rows = await this.samples.findAll({
      where: { versionId },
      attributes: [
        'site',
        'latitudeDeg',
        'longitudeDeg',
        'regionCode',
        [fn('count', col('id')), 'sampleCount'],
        [fn('min', col('age_ka_bp')), 'youngestKaBp'],
        [fn('max', col('age_ka_bp')), 'oldestKaBp'],
      ],
      group: ['site', 'latitude_deg', 'longitude_deg', 'region_code'],
      order: [['site', 'ASC']],
      raw: true,
    });
    return rows as unknown as SiteSummary[];
  }
}

function viewOf(row: SampleRow): SampleView {
  return {
    id: row.id,
    site: row.site,
    latitudeDeg: row.latitudeDeg,
    longitudeDeg: row.longitudeDeg,
    ageKaBp: row.ageKaBp,
    ageYoungKaBp: row.ageYoungKaBp ?? null,
    ageOldKaBp: row.ageOldKaBp ?? null,
    ageSigmaKa: row.ageSigmaKa ?? null,
    depthM: row.depthM ?? null,
    quantity: row.quantity,
    fluxGM2Yr: row.fluxGM2Yr,
    fluxSigmaGM2Yr: row.fluxSigmaGM2Yr ?? null,
    sizeCutoff: row.sizeCutoff ?? null,
    sheet: row.sheet,
    row: row.row,
    cells: row.cells,
  };
}
