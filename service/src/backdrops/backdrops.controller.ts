import { Controller, Get } from '@nestjs/common';
import { ApiOperation } from '@nestjs/swagger';
import { SignedInOnly } from '../auth/policy';
import { BackdropsService } from './backdrops.service';

@Controller('backdrops')
export class BackdropsController {
  constructor(private readonly backdrops: BackdropsService) {}

  @Get()
  @SignedInOnly()
  @ApiOperation({ summary: 'Published backdrops: surface albedo and cloud by latitude band' })
  async list() {
    return { items: await this.backdrops.list() };
  }
}
