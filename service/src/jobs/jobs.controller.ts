import { Controller, Get, HttpCode, Param, Post, Query } from '@nestjs/common';
import { ApiOkResponse, ApiOperation, ApiTags } from '@nestjs/swagger';
import type { JobSummary } from '@siltlight/common/wire/jobs';
import type { Page } from '@siltlight/common/wire/shared';
import { Person, SignedIn, SignedInOnly } from '../auth/policy';
import { pageOf } from '../http/paging';
import { JobDto, JobPageDto, JobsQueryDto } from './dto/job.dto';
import { JobsService } from './jobs.service';
import { summaryOf } from './models/job-row';

@ApiTags('jobs')
@Controller('jobs')
@SignedInOnly()
export class JobsController {
  constructor(private readonly jobs: JobsService) {}

  @Get()
  @ApiOperation({ summary: 'Own jobs, newest first' })
  @ApiOkResponse({ type: JobPageDto })
  list(@SignedIn() person: Person, @Query() query: JobsQueryDto): Promise<Page<JobSummary>> {
    return pageOf(query, {
      fetch: (count, after) => this.jobs.find(person, count, after),
      count: () => this.jobs.count(person),
      keyOf: (row) => row.id,
      toItem: summaryOf,
    });
  }

  @Get(':id')
  @ApiOperation({ summary: 'State and progress of a job; its owner and administrators see it' })
  @ApiOkResponse({ type: JobDto })
  get(@SignedIn() person: Person, @Param('id') id: string): Promise<JobSummary> {
    return this.jobs.get(id, person);
  }

  @Post(':id/cancel')
  @HttpCode(200)
  @ApiOperation({ summary: 'Stops a job that has not finished; it leaves no result' })
  @ApiOkResponse({ type: JobDto })
  cancel(@SignedIn() person: Person, @Param('id') id: string): Promise<JobSummary> {
    return this.jobs.cancel(id, person);
  }
}
