import { exportRequest } from '@siltlight/common/wire/exports';
import { pageQuery } from '@siltlight/common/wire/shared';
import { createZodDto } from 'nestjs-zod';

export class ExportRequestDto extends createZodDto(exportRequest) {}
export class ExportsQueryDto extends createZodDto(pageQuery) {}
