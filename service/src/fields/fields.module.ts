import { Module } from '@nestjs/common';
import { DatasetsModule } from '../datasets/datasets.module';
import { LedgerModule } from '../ledger/ledger.module';
import { SlicesModule } from '../slices/slices.module';
import { PeopleModule } from '../users/people.module';
import { VersionsModule } from '../versions/versions.module';
import { FieldIngredientsFinder } from './field-ingredients-finder.service';
import { FieldViews } from './field-views.service';
import { FieldsController } from './fields.controller';
import { FieldsService } from './fields.service';
import { SiteTraces } from './site-trace.service';

@Module({
  imports: [DatasetsModule, LedgerModule, PeopleModule, SlicesModule, VersionsModule],
  controllers: [FieldsController],
  providers: [FieldIngredientsFinder, FieldsService, FieldViews, SiteTraces],
  exports: [FieldsService, FieldViews],
})
export class FieldsModule {}
