import { Controller, Get } from '@nestjs/common';
import { ApiOperation } from '@nestjs/swagger';
import { SignedInOnly } from '../auth/policy';
import { SlicesService } from './slices.service';

@Controller('slices')
export class SlicesController {
  constructor(private readonly slices: SlicesService) {}

  @Get()
  @SignedInOnly()
  @ApiOperation({ summary: 'Published time slices, youngest first' })
  async list() {
    const slices = await this.slices.list();
    return { items: slices.map(({ id, content }) => ({ versionId: id, ...content })) };
  }
}
