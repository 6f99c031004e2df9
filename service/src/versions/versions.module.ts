import { Module } from '@nestjs/common';
import { SequelizeModule } from '@nestjs/sequelize';
import { ObjectRow } from './models/object-row';
import { VersionRow } from './models/version-row';
import { VersionsService } from './versions.service';

@Module({
  imports: [SequelizeModule.forFeature([ObjectRow, VersionRow])],
  providers: [VersionsService],
  exports: [VersionsService],
})
export class VersionsModule {}
