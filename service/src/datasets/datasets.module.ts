import { Module } from '@nestjs/common';
import { SequelizeModule } from '@nestjs/sequelize';
import { FilesModule } from '../files/files.module';
import { LedgerModule } from '../ledger/ledger.module';
import { PeopleModule } from '../users/people.module';
import { VersionsModule } from '../versions/versions.module';
import { WorkersModule } from '../workers/workers.module';
import { DatasetDependants } from './dataset-dependants';
import { DatasetPublishing } from './dataset-publishing.service';
import { DatasetsController } from './datasets.controller';
import { DatasetsService } from './datasets.service';
import { HeldSites } from './held-sites.service';
import { SampleRow } from './models/sample-row';
import { SamplesService } from './samples.service';
import { SourceCells } from './source-cells.service';

@Module({
  imports: [
    SequelizeModule.forFeature([SampleRow]),
    FilesModule,
    LedgerModule,
    PeopleModule,
    VersionsModule,
    WorkersModule,
  ],
  controllers: [DatasetsController],
  providers: [DatasetDependants, DatasetPublishing, DatasetsService, HeldSites, SamplesService, SourceCells],
  exports: [DatasetDependants, DatasetPublishing, DatasetsService, HeldSites, SamplesService],
})
export class DatasetsModule {}
