import { Body, Controller, Get, HttpCode, Param, Post, Query, Res } from '@nestjs/common';
import { ApiOperation } from '@nestjs/swagger';
import type { Response } from 'express';
import { type Person, Roles, SignedIn, SignedInOnly } from '../auth/policy';
import { attachment } from '../http/attachment';
import { problem } from '../http/problem';
import { canonicalJson } from '../versions/canonical';
import { EstimateRequestDto, EstimatesQueryDto, WithdrawEstimateDto } from './dto';
import { EstimateLists } from './estimate-lists.service';
import { EstimateViews } from './estimate-views.service';
import { EstimatesService } from './estimates.service';
import { SignOff } from './sign-off.service';

@Controller('estimates')
export class EstimatesController {
  constructor(
    private readonly estimates: EstimatesService,
    private readonly lists: EstimateLists,
    private readonly views: EstimateViews,
    private readonly signOff: SignOff,
  ) {}

  @Get()
  @SignedInOnly()
  @ApiOperation({ summary: 'Estimates that one may see, newest first' })
  list(@Query() query: EstimatesQueryDto, @SignedIn() reader: Person) {
    return this.lists.page(query, reader);
  }

  @Post('preview')
  @HttpCode(200)
  @Roles('scientist')
  @ApiOperation({ summary: 'What a run would say, with few members; nothing is kept' })
  preview(@Body() request: EstimateRequestDto) {
    return this.estimates.preview(request);
  }

  @Post()
  @HttpCode(202)
  @Roles('scientist')
  @ApiOperation({ summary: 'Run an estimate as a job' })
  async request(
    @Body() request: EstimateRequestDto,
    @SignedIn() by: Person,
    @Res({ passthrough: true }) response: Response,
  ) {
    const accepted = await this.estimates.request(request, by);
    response.setHeader('Location', accepted.jobPath);
    return accepted;
  }

  @Get(':id')
  @SignedInOnly()
  @ApiOperation({ summary: 'An estimate with its result and what stands beside it' })
  async detail(@Param('id') id: string, @SignedIn() reader: Person) {
    return this.views.detail(await this.views.load(id, reader), reader);
  }

  @Get(':id/run-record')
  @SignedInOnly()
  @ApiOperation({ summary: 'Run record: pinned versions, inputs, seed, code version and result' })
  async runRecord(@Param('id') id: string, @SignedIn() reader: Person, @Res() response: Response) {
    const { run, version } = await this.views.load(id, reader);
    if (!version)
      throw problem(
        409,
        'not-computed',
        'There is no result yet',
        `Run ${run.runNumber} has not been computed.`,
      );
    const fileName = `siltlight-run-${run.runNumber}.json`;
    attachment(response, {
      fileName,
      mediaType: 'application/json; charset=utf-8',
      sha256: version.checksum,
    });
    response.send(Buffer.from(canonicalJson(version.content), 'utf8'));
  }

  @Post(':id/sign-off')
  @HttpCode(200)
  @Roles('scientist', 'steward')
  @ApiOperation({ summary: 'Publish a computed estimate of somebody else' })
  async sign(@Param('id') id: string, @SignedIn() by: Person) {
    await this.signOff.sign(id, by);
    return this.detail(id, by);
  }

  @Post(':id/withdraw')
  @HttpCode(200)
  @Roles('scientist', 'steward')
  @ApiOperation({ summary: 'Withdraw a published estimate with a reason' })
  async withdraw(@Param('id') id: string, @Body() { reason }: WithdrawEstimateDto, @SignedIn() by: Person) {
    await this.signOff.withdraw(id, by, reason);
    return this.detail(id, by);
  }

  @Post(':id/run-again')
  @HttpCode(202)
  @Roles('scientist')
  @ApiOperation({ summary: 'Run the same request again: the same bytes, unless the code has changed' })
  async runAgain(
    @Param('id') id: string,
    @SignedIn() by: Person,
    @Res({ passthrough: true }) response: Response,
  ) {
    const { run } = await this.views.load(id, by);
    const accepted = await this.estimates.request(run.request, by);
    response.setHeader('Location', accepted.jobPath);
    return accepted;
  }
}
