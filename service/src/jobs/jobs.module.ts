import { Module } from '@nestjs/common';
import { SequelizeModule } from '@nestjs/sequelize';
import { JobRunner } from './job-runner';
import { JobsController } from './jobs.controller';
import { JobStates } from './job-states.service';
import { JobsService } from './jobs.service';
import { JobRow } from './models/job-row';

@Module({
  imports: [SequelizeModule.forFeature([JobRow])],
  controllers: [JobsController],
  providers: [JobRunner, JobStates, JobsService],
  exports: [JobStates, JobsService],
})
export class JobsModule {}
