import { Module } from '@nestjs/common';
import { SequelizeModule } from '@nestjs/sequelize';
import { JobRunner } from './job-runner';
import { JobsController } from './jobs.controller';
import { JobsService } from './jobs.service';
import { JobRow } from './models/job-row';

@Module({
  imports: [SequelizeModule.forFeature([JobRow])],
  controllers: [JobsController],
  providers: [JobRunner, JobsService],
  exports: [JobsService],
})
export class JobsModule {}
