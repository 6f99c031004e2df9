import {
  Body,
  Controller,
  Get,
  Header,
  Param,
  Post,
  Query,
  Res,
  UploadedFile,
  UseInterceptors,
} from '@nestjs/common';
import { ApiBody, ApiConsumes, ApiOperation } from '@nestjs/swagger';
import { datasetKind } from '@siltlight/common/dataset/kinds';
import { templateFor } from '@siltlight/common/sheet/templates';
import type { Response } from 'express';
import { type Person, Roles, SignedIn, SignedInOnly } from '../auth/policy';
import { FileStore } from '../files/file-store.service';
import { attachment } from '../http/attachment';
import { csvTable } from '../http/csv';
import { LedgerService } from '../ledger/ledger.service';
import { PeopleService } from '../users/people.service';
import { ReceivesFile, requireFile } from '../workers/received-file';
import { FindingsQueryDto, GridQueryDto, SubmissionsQueryDto, TemplateQueryDto, UploadDto } from './dto';
import { Evaluations } from './evaluation.service';
import { gridWindow } from './grid';
import { SubmissionAccess } from './submission-access.service';
import { SubmissionViews } from './submission-views.service';
import { selectFindings, SubmissionsService } from './submissions.service';
import { Uploads } from './uploads.service';

const HISTORY = 200;

@Controller('submissions')
export class SubmissionsController {
  constructor(
    private readonly submissions: SubmissionsService,
    private readonly uploads: Uploads,
    private readonly access: SubmissionAccess,
    private readonly views: SubmissionViews,
    private readonly evaluations: Evaluations,
    private readonly files: FileStore,
    private readonly ledger: LedgerService,
    private readonly people: PeopleService,
  ) {}

  @Get()
  @Roles('scientist', 'steward')
  @ApiOperation({ summary: 'Submissions that one may see; the queue oldest first, other lists newest first' })
  list(@Query() query: SubmissionsQueryDto, @SignedIn() reader: Person) {
    return this.submissions.list(query, reader);
  }

  @Post()
  @Roles('scientist', 'steward')
  @UseInterceptors(ReceivesFile())
  @ApiConsumes('multipart/form-data')
  @ApiBody({
    schema: {
      type: 'object',
      required: ['file'],
      properties: {
        file: { type: 'string', format: 'binary' },
        kind: { type: 'string', enum: ['dust-flux', 'point-optical-depth'] },
        title: { type: 'string', maxLength: 300 },
      },
    },
  })
  @ApiOperation({ summary: 'Upload a spreadsheet: it is read, mapped and vetted, and kept as a draft' })
  async upload(
    @UploadedFile() received: Express.Multer.File | undefined,
    @Body() given: UploadDto,
    @SignedIn() by: Person,
  ) {
    const submission = await this.uploads.take(requireFile(received), given, by);
    return this.views.detail(submission, by);
  }

  @Get('template')
  @SignedInOnly()
  @Header('Content-Type', 'text/csv; charset=utf-8')
  @ApiOperation({ summary: 'An empty table with headings, units and notes' })
  template(@Query() { kind }: TemplateQueryDto, @Res({ passthrough: true }) response: Response): string {
    const { fileName, rows, notes } = templateFor(datasetKind(kind));
    response.setHeader('Content-Disposition', `attachment; filename="${fileName}"`);
    return csvTable([...rows, [], ...notes.map((note) => [note])]);
  }

  @Get(':id')
  @Roles('scientist', 'steward')
  @ApiOperation({ summary: 'A submission with its mapping, form, queries and rights' })
  async detail(@Param('id') id: string, @SignedIn() reader: Person) {
    return this.views.detail(await this.access.visible(id, reader), reader);
  }

  @Get(':id/grid')
  @Roles('scientist', 'steward')
  @ApiOperation({ summary: 'Rows of a sheet: raw cells and canonical values' })
  async grid(@Param('id') id: string, @Query() query: GridQueryDto, @SignedIn() reader: Person) {
    const submission = await this.access.visible(id, reader);
    return gridWindow(await this.evaluations.of(submission), submission.mapping.tables, query);
  }

  @Get(':id/findings')
  @Roles('scientist', 'steward')
  @ApiOperation({ summary: 'Findings in reading order, with counts by rule' })
  async findings(@Param('id') id: string, @Query() query: FindingsQueryDto, @SignedIn() reader: Person) {
    const submission = await this.access.visible(id, reader);
    return selectFindings(await this.views.findings(submission), query);
  }

  @Get(':id/file')
  @Roles('scientist', 'steward')
  @ApiOperation({ summary: 'The file as it was uploaded, byte for byte' })
  async file(@Param('id') id: string, @SignedIn() reader: Person, @Res() response: Response) {
    const { fileName, fileSha256, fileBytes } = await this.access.visible(id, reader);
    attachment(response, {
      fileName,
      mediaType: 'application/octet-stream',
      sha256: fileSha256,
      bytes: fileBytes,
    });
    (await this.files.stream(fileSha256)).pipe(response);
  }

  @Get(':id/history')
  @Roles('scientist', 'steward')
  @ApiOperation({ summary: 'What happened to a submission, newest first' })
  async history(@Param('id') id: string, @SignedIn() reader: Person) {
    const { id: objectId } = await this.access.visible(id, reader);
    const rows = await this.ledger.find({ objectKind: 'submission', objectId }, HISTORY);
    const items = rows.map(async ({ at, actorId, summary }) => ({
      at,
      who: actorId === null ? null : await this.people.mark(actorId),
      summary,
    }));
    return { items: await Promise.all(items) };
  }
}
