import { Module } from '@nestjs/common';
import { SequelizeModule } from '@nestjs/sequelize';
import { DatasetsModule } from '../datasets/datasets.module';
import { FilesModule } from '../files/files.module';
import { LedgerModule } from '../ledger/ledger.module';
import { NotificationsModule } from '../notifications/notifications.module';
import { PeopleModule } from '../users/people.module';
import { WorkersModule } from '../workers/workers.module';
import { Evaluations } from './evaluation.service';
import { Handover } from './handover.service';
import { MendingController } from './mending.controller';
import { Mending } from './mending.service';
import { SubmissionRow } from './models/submission-row';
import {
  CorrectionRow,
  DecisionRow,
  LeftOutRow,
  QueryRow,
  RememberedMappingRow,
  ReplyRow,
  WaiverRow,
} from './models/working-rows';
import { RememberedMappings } from './remembered-mappings.service';
import { RulesController } from './rules.controller';
import { SubmissionAccess } from './submission-access.service';
import { SubmissionChanges } from './submission-changes.service';
import { SubmissionViews } from './submission-views.service';
import { SubmissionsController } from './submissions.controller';
import { SubmissionsService } from './submissions.service';
import { Uploads } from './uploads.service';

const models = SequelizeModule.forFeature([
  SubmissionRow,
  CorrectionRow,
  DecisionRow,
  LeftOutRow,
  QueryRow,
  RememberedMappingRow,
  ReplyRow,
  WaiverRow,
]);

@Module({
  imports: [
    models,
    DatasetsModule,
    FilesModule,
    LedgerModule,
    NotificationsModule,
    PeopleModule,
    WorkersModule,
  ],
  controllers: [SubmissionsController, MendingController, RulesController],
  providers: [
    Evaluations,
    Handover,
    Mending,
    RememberedMappings,
    SubmissionAccess,
    SubmissionChanges,
    SubmissionViews,
    SubmissionsService,
    Uploads,
  ],
  exports: [
    models,
    Evaluations,
    Handover,
    Mending,
    SubmissionAccess,
    SubmissionChanges,
    SubmissionViews,
    SubmissionsService,
    Uploads,
  ],
})
export class SubmissionsModule {}
