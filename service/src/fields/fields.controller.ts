import { Body, Controller, Get, HttpCode, Param, Post, Query } from '@nestjs/common';
import { ApiOperation } from '@nestjs/swagger';
import { type Person, Roles, SignedIn, SignedInOnly } from '../auth/policy';
import { FieldRequestDto, FieldsQueryDto, TraceQueryDto } from './dto';
import { FieldViews } from './field-views.service';
import { FieldsService } from './fields.service';
import { opticalDepthGrid } from './region-optical-depths';
import { SiteTraces } from './site-trace.service';

@Controller('fields')
export class FieldsController {
  constructor(
    private readonly fields: FieldsService,
    private readonly views: FieldViews,
    private readonly traces: SiteTraces,
  ) {}

  @Get()
  @SignedInOnly()
  @ApiOperation({ summary: 'Fields, newest first; of one slice when it is named' })
  async list(@Query() { slice }: FieldsQueryDto) {
    const versions = await this.fields.ofSlice(slice);
    return { items: await Promise.all(versions.map((version) => this.views.detail(version))) };
  }

  @Post('preview')
  @HttpCode(200)
  @Roles('scientist')
  @ApiOperation({ summary: 'Build a field without keeping it' })
  preview(@Body() request: FieldRequestDto, @SignedIn() by: Person) {
    return this.fields.preview(request, by);
  }

  @Post()
  @Roles('scientist')
  @ApiOperation({ summary: 'Build a field of a slice and keep it' })
  build(@Body() request: FieldRequestDto, @SignedIn() by: Person) {
    return this.fields.build(request, by);
  }

  @Get(':versionId')
  @SignedInOnly()
  @ApiOperation({ summary: 'A field with its regions, sites and diagnostics' })
  detail(@Param('versionId') versionId: string) {
    return this.fields.detail(versionId);
  }

  @Get(':versionId/grid')
  @SignedInOnly()
  @ApiOperation({ summary: 'Optical depth at 550 nm on the working grid, row by row from 90° S, 180° W' })
  async grid(@Param('versionId') versionId: string) {
    const { content } = await this.fields.get(versionId);
    const lnRatios = new Map(content.regions.map(({ code, lnRatio }) => [code, lnRatio]));
    const grid = opticalDepthGrid(content.baseField, lnRatios, content.global.lnRatio);
    return {
      stepDeg: grid.stepDeg,
      opticalDepthSlice: Array.from(grid.opticalDepthSlice),
      opticalDepthReference: Array.from(grid.opticalDepthReference),
    };
  }

  @Get(':versionId/trace')
  @SignedInOnly()
  @ApiOperation({ summary: 'The samples behind the fluxes of a site, with their cells' })
  async trace(@Param('versionId') versionId: string, @Query() { site, dataset }: TraceQueryDto) {
    return this.traces.trace(await this.fields.get(versionId), site, dataset);
  }
}
