import { Module } from '@nestjs/common';
import { VersionsModule } from '../versions/versions.module';
import { OpticalSetsController } from './optical-sets.controller';
import { OpticalSetsService } from './optical-sets.service';

@Module({
  imports: [VersionsModule],
  controllers: [OpticalSetsController],
  providers: [OpticalSetsService],
  exports: [OpticalSetsService],
})
export class OpticsModule {}
