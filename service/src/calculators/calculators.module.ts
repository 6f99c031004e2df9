import { Module } from '@nestjs/common';
import { SubmissionsModule } from '../submissions/submissions.module';
import { CalculatorsController } from './calculators.controller';
import { CheckFileController } from './check-file.controller';
import { CheckFile } from './check-file.service';

@Module({
  imports: [SubmissionsModule],
  controllers: [CalculatorsController, CheckFileController],
  providers: [CheckFile],
})
export class CalculatorsModule {}
