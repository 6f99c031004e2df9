import { Controller, Get } from '@nestjs/common';
import { ApiOperation, ApiTags } from '@nestjs/swagger';
import { Public } from '../auth/policy';
import { HealthService } from './health.service';

@ApiTags('health')
@Controller('api/health')
export class HealthController {
  constructor(private readonly health: HealthService) {}

  @Get('live')
  @Public()
  @ApiOperation({ summary: 'Does the process answer? Touches nothing else.' })
  live() {
    return { status: 'live' };
  }

  @Get('ready')
  @Public()
  @ApiOperation({ summary: 'Can it do its work: database write, schema, disk, outbox?' })
  ready() {
    return this.health.ready();
  }
}
