import { Body, Controller, Delete, Headers, HttpCode, Param, Post, Put } from '@nestjs/common';
import { ApiOperation } from '@nestjs/swagger';
import type { SubmissionDetail } from '@siltlight/common/wire/submissions';
import { type Person, Roles, SignedIn } from '../auth/policy';
import { CorrectionsDto, LeaveOutDto, MappingDto, MetadataDto, TakeBackDto, WithdrawDto } from './dto';
import { Handover } from './handover.service';
import { Mending } from './mending.service';
import type { SubmissionRow } from './models/submission-row';
import { SubmissionViews } from './submission-views.service';

/** Changes by the contributor. Each needs If-Match with the revision that was seen. */
@Controller('submissions/:id')
@Roles('scientist', 'steward')
export class MendingController {
  constructor(
    private readonly mending: Mending,
    private readonly handover: Handover,
    private readonly views: SubmissionViews,
  ) {}

  @Put('mapping')
  @ApiOperation({ summary: 'Correct tables, columns, units and constants' })
  mapping(
    @Param('id') id: string,
    @Headers('if-match') ifMatch: string,
    @Body() body: MappingDto,
    @SignedIn() by: Person,
  ) {
    return this.answer(this.mending.setMapping({ id, ifMatch, by }, body), by);
  }

  @Put('metadata')
  @ApiOperation({ summary: 'Fill in the form' })
  metadata(
    @Param('id') id: string,
    @Headers('if-match') ifMatch: string,
    @Body() body: MetadataDto,
    @SignedIn() by: Person,
  ) {
    return this.answer(this.mending.setMetadata({ id, ifMatch, by }, body), by);
  }

  @Post('corrections')
  @HttpCode(200)
  @ApiOperation({ summary: 'Type over cells; the raw text stays' })
  correct(
    @Param('id') id: string,
    @Headers('if-match') ifMatch: string,
    @Body() body: CorrectionsDto,
    @SignedIn() by: Person,
  ) {
    return this.answer(this.mending.correct({ id, ifMatch, by }, body.corrections), by);
  }

  @Delete('corrections/:correctionId')
  @ApiOperation({ summary: 'Undo a mend' })
  undo(
    @Param('id') id: string,
    @Param('correctionId') correctionId: string,
    @Headers('if-match') ifMatch: string,
    @SignedIn() by: Person,
  ) {
    return this.answer(this.mending.undo({ id, ifMatch, by }, correctionId), by);
  }

  @Post('leave-out')
  @HttpCode(200)
  @ApiOperation({ summary: 'Leave rows out with a reason; they stay visible' })
  leaveOut(
    @Param('id') id: string,
    @Headers('if-match') ifMatch: string,
    @Body() body: LeaveOutDto,
    @SignedIn() by: Person,
  ) {
    return this.answer(this.mending.leaveOut({ id, ifMatch, by }, body.rows, body.reason), by);
  }

  @Post('take-back')
  @HttpCode(200)
  @ApiOperation({ summary: 'Take rows back in' })
  takeBack(
    @Param('id') id: string,
    @Headers('if-match') ifMatch: string,
    @Body() body: TakeBackDto,
    @SignedIn() by: Person,
  ) {
    return this.answer(this.mending.takeBack({ id, ifMatch, by }, body.rows), by);
  }

  @Post('submit')
  @HttpCode(200)
  @ApiOperation({ summary: 'Hand in for vetting' })
  submit(@Param('id') id: string, @Headers('if-match') ifMatch: string, @SignedIn() by: Person) {
    return this.answer(this.handover.submit({ id, ifMatch, by }), by);
  }

  @Post('withdraw')
  @HttpCode(200)
  @ApiOperation({ summary: 'Withdraw with a reason' })
  withdraw(
    @Param('id') id: string,
    @Headers('if-match') ifMatch: string,
    @Body() body: WithdrawDto,
    @SignedIn() by: Person,
  ) {
    return this.answer(this.handover.withdraw({ id, ifMatch, by }, body.reason), by);
  }

  private async answer(changed: Promise<SubmissionRow>, by: Person): Promise<SubmissionDetail> {
    return this.views.detail(await changed, by);
  }
}
