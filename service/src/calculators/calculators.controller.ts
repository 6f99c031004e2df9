import { Body, Controller, HttpCode, Post } from '@nestjs/common';
import { ApiBody, ApiOperation } from '@nestjs/swagger';
import { calculateColumn, type ColumnRequest } from '@siltlight/common/forcing/column';
import { calculateForcing, type ForcingRequest } from '@siltlight/common/forcing/calculate-forcing';
import { calculateLayer, type LayerRequest } from '@siltlight/common/forcing/calculate-layer';
import { calculateGreenhouse, type GreenhouseRequest } from '@siltlight/common/forcing/greenhouse';
import {
  calculateHumidityGrowth,
  type HumidityGrowthRequest,
} from '@siltlight/common/optics/humidity-growth';
import { calculateMie, type MieRequest } from '@siltlight/common/optics/calculate-mie';
import { calculateMixedIndex, type MixedIndexRequest } from '@siltlight/common/optics/calculate-mixed-index';
import { calculateModeOptics, type ModeOpticsRequest } from '@siltlight/common/optics/calculate-mode-optics';
import { calculateUpscatter, type UpscatterRequest } from '@siltlight/common/optics/calculate-upscatter';
import { calculateInsolation, type InsolationRequest } from '@siltlight/common/orbit/calculate-insolation';
import { calculateOrbit, type OrbitRequest } from '@siltlight/common/orbit/calculate-orbit';
import { calculateRegionAreas } from '@siltlight/common/sphere/region-areas';
import { SignedInOnly } from '../auth/policy';
import { PlainObjectDto } from './plain-object.dto';
import { requestSchemas } from './request-schemas';

/** Thin: each hands the body to one function of `common`, which reads, checks and computes. */
@Controller('calculators')
@SignedInOnly()
export class CalculatorsController {
  @Post('orbit')
  @HttpCode(200)
  @ApiBody({ schema: requestSchemas.orbit })
  @ApiOperation({ summary: 'Orbital elements at an age' })
  orbit(@Body() body: PlainObjectDto) {
    return calculateOrbit(body as unknown as OrbitRequest);
  }

  @Post('insolation')
  @HttpCode(200)
  @ApiBody({ schema: requestSchemas.insolation })
  @ApiOperation({ summary: 'Daily insolation at the top of the atmosphere' })
  insolation(@Body() body: PlainObjectDto) {
    return calculateInsolation(body as unknown as InsolationRequest);
  }

  @Post('forcing')
  @HttpCode(200)
  @ApiBody({ schema: requestSchemas.forcing })
  @ApiOperation({ summary: 'Forcing of one cell by the method named' })
  forcing(@Body() body: PlainObjectDto) {
    return calculateForcing(body as unknown as ForcingRequest);
  }

  @Post('layer')
  @HttpCode(200)
  @ApiBody({ schema: requestSchemas.layer })
  @ApiOperation({ summary: 'Reflectance, transmittance and absorptance of a layer over its surface' })
  layer(@Body() body: PlainObjectDto) {
    return calculateLayer(body as unknown as LayerRequest);
  }

  @Post('mie')
  @HttpCode(200)
  @ApiBody({ schema: requestSchemas.mie })
  @ApiOperation({ summary: 'Efficiencies and asymmetry of one homogeneous sphere' })
  mie(@Body() body: PlainObjectDto) {
    return calculateMie(body as unknown as MieRequest);
  }

  @Post('mode-optics')
  @HttpCode(200)
  @ApiBody({ schema: requestSchemas['mode-optics'] })
  @ApiOperation({ summary: 'Optics of an external mixture of lognormal modes at one wavelength' })
  modeOptics(@Body() body: PlainObjectDto) {
    return calculateModeOptics(body as unknown as ModeOpticsRequest);
  }

  @Post('mixed-index')
  @HttpCode(200)
  @ApiBody({ schema: requestSchemas['mixed-index'] })
  @ApiOperation({ summary: 'Refractive index of an internal mixture' })
  mixedIndex(@Body() body: PlainObjectDto) {
    return calculateMixedIndex(body as unknown as MixedIndexRequest);
  }

  @Post('upscatter')
  @HttpCode(200)
  @ApiBody({ schema: requestSchemas.upscatter })
  @ApiOperation({ summary: 'Upscatter fraction of an asymmetry parameter' })
  upscatter(@Body() body: PlainObjectDto) {
    return calculateUpscatter(body as unknown as UpscatterRequest);
  }

  @Post('greenhouse')
  @HttpCode(200)
  @ApiBody({ schema: requestSchemas.greenhouse })
  @ApiOperation({ summary: 'Forcing of well-mixed greenhouse gases against a reference' })
  greenhouse(@Body() body: PlainObjectDto) {
    return calculateGreenhouse(body as unknown as GreenhouseRequest);
  }

  @Post('column')
  @HttpCode(200)
  @ApiBody({ schema: requestSchemas.column })
  @ApiOperation({ summary: 'Deposition to burden to optical depth' })
  column(@Body() body: PlainObjectDto) {
    return calculateColumn(body as unknown as ColumnRequest);
  }

  @Post('humidity-growth')
  @HttpCode(200)
  @ApiBody({ schema: requestSchemas['humidity-growth'] })
  @ApiOperation({ summary: 'Diameter growth factor at a relative humidity' })
  humidityGrowth(@Body() body: PlainObjectDto) {
    return calculateHumidityGrowth(body as unknown as HumidityGrowthRequest);
  }

  @Post('region-areas')
  @HttpCode(200)
  @ApiBody({ schema: requestSchemas['region-areas'] })
  @ApiOperation({ summary: 'Areas of the regions of a set' })
  regionAreas(@Body() body: PlainObjectDto) {
    return calculateRegionAreas(body as unknown as { regionSet: string });
  }
}
