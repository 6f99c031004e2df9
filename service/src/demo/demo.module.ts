import { Module } from '@nestjs/common';
import { BackdropsModule } from '../backdrops/backdrops.module';
import { DatasetsModule } from '../datasets/datasets.module';
import { EstimatesModule } from '../estimates/estimates.module';
import { FieldsModule } from '../fields/fields.module';
import { OpticsModule } from '../optics/optics.module';
import { ReviewModule } from '../review/review.module';
import { SubmissionsModule } from '../submissions/submissions.module';
import { PeopleModule } from '../users/people.module';
import { DemoEstimates } from './demo-estimates';
import { DemoIntake } from './demo-intake';
import { DemoScenario } from './demo-scenario.seed';

/** The invented scenario; its steps run only in demo mode, after everything else is there. */
@Module({
  imports: [
    BackdropsModule,
    DatasetsModule,
    EstimatesModule,
    FieldsModule,
    OpticsModule,
    PeopleModule,
    ReviewModule,
    SubmissionsModule,
  ],
  providers: [DemoEstimates, DemoIntake, DemoScenario],
})
export class DemoModule {}
