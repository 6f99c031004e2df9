import { Module } from '@nestjs/common';
import { DatasetsModule } from '../datasets/datasets.module';
import { EstimatesModule } from '../estimates/estimates.module';
import { LedgerModule } from '../ledger/ledger.module';
import { SlicesModule } from '../slices/slices.module';
import { SubmissionsModule } from '../submissions/submissions.module';
import { DeskController } from './desk.controller';
import { DeskService } from './desk.service';
import { SearchService } from './search.service';

@Module({
  imports: [DatasetsModule, EstimatesModule, LedgerModule, SlicesModule, SubmissionsModule],
  controllers: [DeskController],
  providers: [DeskService, SearchService],
})
export class DeskModule {}
