import { Controller, Get } from '@nestjs/common';
import { ApiOperation } from '@nestjs/swagger';
import { AR6_REGIONS } from '@siltlight/common/tables/ar6-regions';
import { SignedInOnly } from '../auth/policy';

@Controller('regions')
export class RegionsController {
  /** Outlines for maps. Iturbide et al. (2020), CC BY 4.0, reshaped. */
  @Get('ar6')
  @SignedInOnly()
  @ApiOperation({
    summary: 'The AR6 reference regions with their outlines (Iturbide et al. 2020, CC BY 4.0)',
  })
  ar6() {
    return {
      regions: AR6_REGIONS.map(({ code, name, kind, parts }) => ({ code, name, kind, parts })),
      source: 'Iturbide et al. (2020), Earth Syst. Sci. Data 12, 2959–2970, CC BY 4.0, reshaped',
    };
  }
}
