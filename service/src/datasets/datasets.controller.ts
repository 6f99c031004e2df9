import {
  Body,
  Controller,
  Get,
  Header,
  HttpCode,
  Param,
  ParseIntPipe,
  Post,
  Query,
  Res,
} from '@nestjs/common';
import { ApiOperation } from '@nestjs/swagger';
import type { Response } from 'express';
import { type Person, Roles, SignedIn, SignedInOnly } from '../auth/policy';
import { WriteQueue } from '../database/write-queue';
import { FileStore } from '../files/file-store.service';
import { attachment } from '../http/attachment';
import { PeopleService } from '../users/people.service';
import { canonicalJson } from '../versions/canonical';
import { DatasetPublishing } from './dataset-publishing.service';
import { DatasetsService } from './datasets.service';
import { CellsQueryDto, SamplesQueryDto, WithdrawDto } from './dto';
import { provenanceOf } from './provenance';
import { SamplesService } from './samples.service';
import { SourceCells } from './source-cells.service';

@Controller('datasets')
export class DatasetsController {
  constructor(
    private readonly datasets: DatasetsService,
    private readonly samples: SamplesService,
    private readonly publishing: DatasetPublishing,
    private readonly cells: SourceCells,
    private readonly people: PeopleService,
    private readonly files: FileStore,
    private readonly writes: WriteQueue,
  ) {}

  @Get()
  @SignedInOnly()
  @ApiOperation({ summary: 'Datasets with the version in force' })
  async list() {
    return { items: await this.datasets.list() };
  }

  @Get(':slug')
  @SignedInOnly()
  @ApiOperation({ summary: 'A dataset at the version in force' })
  async latest(@Param('slug') slug: string, @SignedIn() reader: Person) {
    return this.datasets.detail(await this.datasets.version(slug), reader);
  }

  @Get(':slug/versions/:number')
  @SignedInOnly()
  @ApiOperation({ summary: 'One version of a dataset' })
  async version(
    @Param('slug') slug: string,
    @Param('number', ParseIntPipe) number: number,
    @SignedIn() reader: Person,
  ) {
    return this.datasets.detail(await this.datasets.version(slug, number), reader);
  }

  @Get(':slug/versions/:number/samples')
  @SignedInOnly()
  @ApiOperation({ summary: 'Samples of a version, in the order of the file' })
  async page(
    @Param('slug') slug: string,
    @Param('number', ParseIntPipe) number: number,
    @Query() query: SamplesQueryDto,
  ) {
    const { id } = await this.datasets.version(slug, number);
    return this.samples.page(id, query);
  }

  @Get(':slug/versions/:number/content')
  @SignedInOnly()
  @Header('Content-Type', 'application/json; charset=utf-8')
  @ApiOperation({ summary: 'Canonical content: its SHA-256 is the checksum' })
  async content(
    @Param('slug') slug: string,
    @Param('number', ParseIntPipe) number: number,
    @Res() response: Response,
  ) {
    const version = await this.datasets.version(slug, number);
    response.setHeader('ETag', `"${version.checksum}"`);
    response.setHeader('Cache-Control', 'private, no-cache');
    response.send(Buffer.from(canonicalJson(version.content), 'utf8'));
  }

  @Get(':slug/versions/:number/file')
  @SignedInOnly()
  @ApiOperation({ summary: 'The file as it was uploaded, byte for byte' })
  async file(
    @Param('slug') slug: string,
    @Param('number', ParseIntPipe) number: number,
    @Res() response: Response,
  ) {
    const { content } = await this.datasets.version(slug, number);
    attachment(response, {
      fileName: content.file.fileName,
      mediaType: 'application/octet-stream',
      sha256: content.file.sha256,
    });
    (await this.files.stream(content.file.sha256)).pipe(response);
  }

  @Get(':slug/versions/:number/provenance')
  @SignedInOnly()
  @ApiOperation({ summary: 'W3C PROV of a version' })
  async provenance(@Param('slug') slug: string, @Param('number', ParseIntPipe) number: number) {
    const version = await this.datasets.version(slug, number);
    return provenanceOf(
      version,
      version.publishedBy === null ? null : await this.people.mark(version.publishedBy),
    );
  }

  @Get(':slug/versions/:number/cells')
  @SignedInOnly()
  @ApiOperation({ summary: 'Cells of the uploaded file around one row' })
  async source(
    @Param('slug') slug: string,
    @Param('number', ParseIntPipe) number: number,
    @Query() query: CellsQueryDto,
  ) {
    return this.cells.around(await this.datasets.version(slug, number), query.sheet, query.row);
  }

  @Post(':slug/versions/:number/withdraw')
  @HttpCode(200)
  @Roles('steward')
  @ApiOperation({ summary: 'Withdraw a version with a reason; it stays readable' })
  async withdraw(
    @Param('slug') slug: string,
    @Param('number', ParseIntPipe) number: number,
    @Body() body: WithdrawDto,
    @SignedIn() by: Person,
  ) {
    const { id } = await this.datasets.version(slug, number);
    await this.writes.run((transaction) => this.publishing.withdraw(id, by, body.reason, transaction));
    return this.datasets.detail(await this.datasets.version(slug, number), by);
  }
}
