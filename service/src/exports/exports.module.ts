import { Module } from '@nestjs/common';
import { SequelizeModule } from '@nestjs/sequelize';
import { DatasetsModule } from '../datasets/datasets.module';
import { EstimatesModule } from '../estimates/estimates.module';
import { FilesModule } from '../files/files.module';
import { JobsModule } from '../jobs/jobs.module';
import { LedgerModule } from '../ledger/ledger.module';
import { SlicesModule } from '../slices/slices.module';
import { PeopleModule } from '../users/people.module';
import { ExportsController } from './exports.controller';
import { ExportSubjects } from './export-subjects.service';
import { ExportsService } from './exports.service';
import { ExportRow } from './models/export-row';

@Module({
  imports: [
    SequelizeModule.forFeature([ExportRow]),
    DatasetsModule,
    EstimatesModule,
    FilesModule,
    JobsModule,
    LedgerModule,
    PeopleModule,
    SlicesModule,
  ],
  controllers: [ExportsController],
  providers: [ExportSubjects, ExportsService],
})
export class ExportsModule {}
