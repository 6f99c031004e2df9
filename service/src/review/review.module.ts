import { Module } from '@nestjs/common';
import { DatasetsModule } from '../datasets/datasets.module';
import { NotificationsModule } from '../notifications/notifications.module';
import { SubmissionsModule } from '../submissions/submissions.module';
import { PeopleModule } from '../users/people.module';
import { Decisions } from './decisions.service';
import { ReviewController } from './review.controller';
import { Review } from './review.service';

@Module({
  imports: [DatasetsModule, NotificationsModule, PeopleModule, SubmissionsModule],
  controllers: [ReviewController],
  providers: [Decisions, Review],
  exports: [Decisions, Review],
})
export class ReviewModule {}
