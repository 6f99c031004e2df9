import { Injectable } from '@nestjs/common';
import { InjectModel } from '@nestjs/sequelize';
import type { JobSummary } from '@siltlight/common/wire/jobs';
import { JobRow } from './models/job-row';

/** State of a job for the feature that asked for it, which decides itself who may know. */
@Injectable()
export class JobStates {
  constructor(@InjectModel(JobRow) private readonly rows: typeof JobRow) {}

  async of(jobId: string): Promise<JobSummary['state']> {
    const row = await this.rows.findByPk(jobId);
    if (!row) throw new Error(`Job ${jobId} is gone.`);
    return row.state;
  }
}
