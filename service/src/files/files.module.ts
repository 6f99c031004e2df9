import { Module } from '@nestjs/common';
import { SequelizeModule } from '@nestjs/sequelize';
import { FileStore } from './file-store.service';
import { FileSweep } from './file-sweep.service';
import { StoredFileRow } from './models/stored-file-row';

@Module({
  imports: [SequelizeModule.forFeature([StoredFileRow])],
  providers: [FileStore, FileSweep],
  exports: [FileStore],
})
export class FilesModule {}
