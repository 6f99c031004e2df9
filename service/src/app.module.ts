import { type DynamicModule, Module } from '@nestjs/common';
import { APP_INTERCEPTOR, APP_PIPE } from '@nestjs/core';
import { ScheduleModule } from '@nestjs/schedule';
import { AuthModule } from './auth/auth.module';
import { BackdropsModule } from './backdrops/backdrops.module';
import { CalculatorsModule } from './calculators/calculators.module';
import { ConfigModule } from './config/config.module';
import type { Settings } from './config/settings';
import { DatabaseModule } from './database/database.module';
import { DatasetsModule } from './datasets/datasets.module';
import { DemoModule } from './demo/demo.module';
import { DeskModule } from './desk/desk.module';
import { EstimatesModule } from './estimates/estimates.module';
import { ExportsModule } from './exports/exports.module';
import { FieldsModule } from './fields/fields.module';
import { FilesModule } from './files/files.module';
import { HealthModule } from './health/health.module';
import { BodyInterceptor } from './http/json-body';
import { ValidationPipe } from './http/validation.pipe';
import { JobsModule } from './jobs/jobs.module';
import { LedgerModule } from './ledger/ledger.module';
import { NotificationsModule } from './notifications/notifications.module';
import { OpticsModule } from './optics/optics.module';
import { RegionsModule } from './regions/regions.module';
import { ReviewModule } from './review/review.module';
import { SlicesModule } from './slices/slices.module';
import { SubmissionsModule } from './submissions/submissions.module';
import { UsersModule } from './users/users.module';
import { VersionsModule } from './versions/versions.module';

/** Each feature adds one line here. */
@Module({})
export class AppModule {
  static forRoot(settings: Settings): DynamicModule {
    return {
      module: AppModule,
      imports: [
        ConfigModule.forRoot(settings),
        DatabaseModule,
        ScheduleModule.forRoot(),
        AuthModule,
        BackdropsModule,
        CalculatorsModule,
        DatasetsModule,
        DemoModule,
        DeskModule,
        EstimatesModule,
        ExportsModule,
        FieldsModule,
        FilesModule,
        HealthModule,
        JobsModule,
        LedgerModule,
        NotificationsModule,
        OpticsModule,
        RegionsModule,
        ReviewModule,
        SlicesModule,
        SubmissionsModule,
        UsersModule,
        VersionsModule,
      ],
      providers: [
        { provide: APP_INTERCEPTOR, useClass: BodyInterceptor },
        { provide: APP_PIPE, useClass: ValidationPipe },
      ],
    };
  }
}
