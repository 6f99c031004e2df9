import { Module } from '@nestjs/common';
import { SequelizeModule } from '@nestjs/sequelize';
import { LedgerModule } from '../ledger/ledger.module';
import { ObjectRow } from './models/object-row';
import { VersionRow } from './models/version-row';
import { ShippedObjects } from './shipped-objects';
import { VersionsService } from './versions.service';

@Module({
  imports: [LedgerModule, SequelizeModule.forFeature([ObjectRow, VersionRow])],
  providers: [VersionsService, ShippedObjects],
  exports: [VersionsService, ShippedObjects],
})
export class VersionsModule {}
