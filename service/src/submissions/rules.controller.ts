import { Controller, Get } from '@nestjs/common';
import { ApiOperation } from '@nestjs/swagger';
import { rulesPage } from '@siltlight/common/vetting/report';
import { SignedInOnly } from '../auth/policy';

@Controller('rules')
export class RulesController {
  @Get()
  @SignedInOnly()
  @ApiOperation({ summary: 'The vetting rules: what each checks, why, its source, and whether it runs' })
  list() {
    return { items: rulesPage() };
  }
}
