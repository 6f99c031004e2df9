import { Module } from '@nestjs/common';
import { VersionsModule } from '../versions/versions.module';
import { BackdropsController } from './backdrops.controller';
import { BackdropsService } from './backdrops.service';

@Module({
  imports: [VersionsModule],
  controllers: [BackdropsController],
  providers: [BackdropsService],
  exports: [BackdropsService],
})
export class BackdropsModule {}
