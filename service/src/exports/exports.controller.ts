import { Body, Controller, Get, Headers, HttpCode, Param, Post, Query, Res } from '@nestjs/common';
import { ApiOperation } from '@nestjs/swagger';
import type { Response } from 'express';
import { type Person, SignedIn, SignedInOnly } from '../auth/policy';
import { FileStore } from '../files/file-store.service';
import { attachment } from '../http/attachment';
import { problem } from '../http/problem';
import { ExportRequestDto, ExportsQueryDto } from './dto';
import { ExportsService } from './exports.service';
import { regionalTableDescriptor } from './formats/regional-table-descriptor';

@Controller('exports')
@SignedInOnly()
export class ExportsController {
  constructor(
    private readonly exports: ExportsService,
    private readonly files: FileStore,
  ) {}

  @Get()
  @ApiOperation({ summary: 'Own files, newest first' })
  list(@Query() query: ExportsQueryDto, @SignedIn() reader: Person) {
    return this.exports.page(query, reader);
  }

  @Post()
  @HttpCode(202)
  @ApiOperation({ summary: 'Make a file of an estimate as a job' })
  async request(
    @Body() body: ExportRequestDto,
    @SignedIn() by: Person,
    @Res({ passthrough: true }) response: Response,
  ) {
    const accepted = await this.exports.request(body, by);
    response.setHeader('Location', accepted.jobPath);
    return accepted;
  }

  @Get(':id')
  @ApiOperation({ summary: 'A file and the state of its making' })
  async detail(@Param('id') id: string, @SignedIn() reader: Person) {
    return this.exports.summary(await this.exports.get(id, reader));
  }

  @Get(':id/descriptor')
  @ApiOperation({ summary: 'Frictionless Data Package of a table' })
  async descriptor(@Param('id') id: string, @SignedIn() reader: Person) {
    const row = await this.exports.get(id, reader);
    if (row.format !== 'regional-table-csv') {
      throw problem(
        404,
        'no-descriptor',
        'This file has no descriptor',
        'Only tables have one; NetCDF describes itself.',
      );
    }
    return regionalTableDescriptor(await this.exports.subjectOf(row, reader), this.exports.finished(row));
  }

  @Get(':id/file')
  @ApiOperation({ summary: 'The finished file' })
  async file(
    @Param('id') id: string,
    @Headers('if-none-match') known: string | undefined,
    @SignedIn() reader: Person,
    @Res() response: Response,
  ) {
    const file = this.exports.finished(await this.exports.get(id, reader));
    attachment(response, file);
    if (matches(known, file.sha256)) {
      response.removeHeader('Content-Length');
      response.status(304).end();
      return;
    }
    (await this.files.stream(file.sha256)).pipe(response);
  }
}

/** RFC 9110 §13.1.2: a list of tags, weak or strong, or any. */
function matches(ifNoneMatch: string | undefined, sha256: string): boolean {
  const tags = (ifNoneMatch ?? '').split(',').map((tag) => tag.trim().replace(/^W\//, ''));
  return tags.includes('*') || tags.includes(`"${sha256}"`);
}
