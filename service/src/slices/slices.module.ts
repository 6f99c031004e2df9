import { Module } from '@nestjs/common';
import { VersionsModule } from '../versions/versions.module';
import { SlicesController } from './slices.controller';
import { SlicesService } from './slices.service';

@Module({
  imports: [VersionsModule],
  controllers: [SlicesController],
  providers: [SlicesService],
  exports: [SlicesService],
})
export class SlicesModule {}
