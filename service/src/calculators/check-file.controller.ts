import { Body, Controller, HttpCode, Post, UploadedFile, UseInterceptors } from '@nestjs/common';
import { ApiBody, ApiConsumes, ApiOperation } from '@nestjs/swagger';
import { SignedInOnly } from '../auth/policy';
import { ReceivesFile, requireFile } from '../workers/received-file';
import { CheckFile, CHECK_FILE_BYTES } from './check-file.service';
import { CheckFileDto } from './check-file.dto';

@Controller('calculators')
export class CheckFileController {
  constructor(private readonly checks: CheckFile) {}

  @Post('check-file')
  @HttpCode(200)
  @SignedInOnly()
  @UseInterceptors(ReceivesFile(CHECK_FILE_BYTES))
  @ApiConsumes('multipart/form-data')
  @ApiBody({
    schema: {
      type: 'object',
      required: ['file'],
      properties: {
        file: { type: 'string', format: 'binary' },
        kind: { type: 'string', enum: ['dust-flux', 'point-optical-depth'] },
        mapping: { type: 'string', description: 'JSON {tables, columns} in the form of the answer' },
        offset: { type: 'integer', minimum: 0 },
        limit: { type: 'integer', minimum: 1, maximum: 10000 },
      },
    },
  })
  @ApiOperation({ summary: 'Read, map, normalise and vet a file without keeping it' })
  check(@UploadedFile() received: Express.Multer.File | undefined, @Body() given: CheckFileDto) {
    return this.checks.check(requireFile(received), given);
  }
}
