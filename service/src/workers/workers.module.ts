import { Module } from '@nestjs/common';
import { FilesModule } from '../files/files.module';
import { ParsedWorkbooks } from './parsed-workbooks.service';

@Module({ imports: [FilesModule], providers: [ParsedWorkbooks], exports: [ParsedWorkbooks] })
export class WorkersModule {}
