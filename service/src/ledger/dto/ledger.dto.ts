import { ledgerCheck, ledgerPage, ledgerQuery } from '@siltlight/common/wire/ledger';
import { createZodDto } from 'nestjs-zod/dto';

export class LedgerQueryDto extends createZodDto(ledgerQuery) {}
export class LedgerPageDto extends createZodDto(ledgerPage) {}
export class LedgerCheckDto extends createZodDto(ledgerCheck) {}
