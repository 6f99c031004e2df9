import { Module } from '@nestjs/common';
import { SequelizeModule } from '@nestjs/sequelize';
import { BackdropsModule } from '../backdrops/backdrops.module';
import { DatasetsModule } from '../datasets/datasets.module';
import { FieldsModule } from '../fields/fields.module';
import { JobsModule } from '../jobs/jobs.module';
import { LedgerModule } from '../ledger/ledger.module';
import { NotificationsModule } from '../notifications/notifications.module';
import { OpticsModule } from '../optics/optics.module';
import { SlicesModule } from '../slices/slices.module';
import { PeopleModule } from '../users/people.module';
import { VersionsModule } from '../versions/versions.module';
import { ComputingProcesses } from './computing-processes.service';
import { EstimateContext } from './estimate-context.service';
import { EstimateDependants } from './estimate-dependants.service';
import { EstimateLists } from './estimate-lists.service';
import { EstimateViews } from './estimate-views.service';
import { EstimatesController } from './estimates.controller';
import { EstimatesService } from './estimates.service';
import { EstimateRunRow } from './models/estimate-run-row';
import { ResolveInputs } from './resolve-inputs.service';
import { SignOff } from './sign-off.service';
import { StrataController } from './strata.controller';
import { Strata } from './strata.service';

@Module({
  imports: [
    SequelizeModule.forFeature([EstimateRunRow]),
    BackdropsModule,
    DatasetsModule,
    FieldsModule,
    JobsModule,
    LedgerModule,
    NotificationsModule,
    OpticsModule,
    PeopleModule,
    SlicesModule,
    VersionsModule,
  ],
  controllers: [StrataController, EstimatesController],
  providers: [
    ComputingProcesses,
    EstimateContext,
    EstimateDependants,
    EstimateLists,
    EstimatesService,
    EstimateViews,
    ResolveInputs,
    SignOff,
    Strata,
  ],
  exports: [EstimateLists, EstimatesService, EstimateViews, SignOff],
})
export class EstimatesModule {}
