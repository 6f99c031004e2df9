import { Controller, Get } from '@nestjs/common';
import { ApiOperation } from '@nestjs/swagger';
import { SignedInOnly } from '../auth/policy';
import { OpticalSetsService } from './optical-sets.service';

@Controller('optical-sets')
export class OpticalSetsController {
  constructor(private readonly sets: OpticalSetsService) {}

  @Get()
  @SignedInOnly()
  @ApiOperation({ summary: 'Published optical sets with their intervals and sources' })
  async list() {
    return { items: await this.sets.list() };
  }
}
