import { Module } from '@nestjs/common';
import { SequelizeModule } from '@nestjs/sequelize';
import { EstimatesModule } from '../estimates/estimates.module';
import { FilesModule } from '../files/files.module';
import { JobsModule } from '../jobs/jobs.module';
import { LedgerModule } from '../ledger/ledger.module';
import { SlicesModule } from '../slices/slices.module';
import { PeopleModule } from '../users/people.module';
import { ExportsController } from './exports.controller';
import { ExportsService } from './exports.service';
import { ExportRow } from './models/export-row';

@Module({
  imports: [
    SequelizeModule.forFeature([ExportRow]),
    EstimatesModule,
    FilesModule,
    JobsModule,
    LedgerModule,
    PeopleModule,
    SlicesModule,
  ],
  controllers: [ExportsController],
  providers: [ExportsService],
})
export class ExportsModule {}
