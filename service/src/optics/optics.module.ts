import { Module } from '@nestjs/common';
import { LedgerModule } from '../ledger/ledger.module';
import { PeopleModule } from '../users/people.module';
import { VersionsModule } from '../versions/versions.module';
import { OpticalSetDrafts } from './optical-set-drafts.service';
import { OpticalSetViews } from './optical-set-views.service';
import { OpticalSetsController } from './optical-sets.controller';
import { OpticalSetsService } from './optical-sets.service';

@Module({
  imports: [LedgerModule, PeopleModule, VersionsModule],
  controllers: [OpticalSetsController],
  providers: [OpticalSetDrafts, OpticalSetsService, OpticalSetViews],
  exports: [OpticalSetsService],
})
export class OpticsModule {}
