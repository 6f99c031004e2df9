import {
  decisionRequest,
  queryRequest,
  replyRequest,
  waiverRequest,
} from '@siltlight/common/wire/submissions';
import { createZodDto } from 'nestjs-zod';

export class WaiverDto extends createZodDto(waiverRequest) {}
export class QueryDto extends createZodDto(queryRequest) {}
export class ReplyDto extends createZodDto(replyRequest) {}
export class DecisionDto extends createZodDto(decisionRequest) {}
