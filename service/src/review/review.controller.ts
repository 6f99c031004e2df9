import { Body, Controller, Headers, HttpCode, Param, Post } from '@nestjs/common';
import { ApiOperation } from '@nestjs/swagger';
import type { SubmissionDetail } from '@siltlight/common/wire/submissions';
import { type Person, Roles, SignedIn } from '../auth/policy';
import type { SubmissionRow } from '../submissions/models/submission-row';
import { SubmissionViews } from '../submissions/submission-views.service';
import { Decisions } from './decisions.service';
import { DecisionDto, QueryDto, ReplyDto, WaiverDto } from './dto';
import { Review } from './review.service';

/** What stewards do with a submission. Each change needs If-Match with the revision that was seen. */
@Controller('submissions/:id')
export class ReviewController {
  constructor(
    private readonly review: Review,
    private readonly decisions: Decisions,
    private readonly views: SubmissionViews,
  ) {}

  @Post('claim')
  @HttpCode(200)
  @Roles('steward')
  @ApiOperation({ summary: 'Take a submission for review' })
  claim(@Param('id') id: string, @Headers('if-match') ifMatch: string, @SignedIn() by: Person) {
    return this.answer(this.review.claim({ id, ifMatch, by }), by);
  }

  @Post('release')
  @HttpCode(200)
  @Roles('steward')
  @ApiOperation({ summary: 'Put it back into the queue' })
  release(@Param('id') id: string, @Headers('if-match') ifMatch: string, @SignedIn() by: Person) {
    return this.answer(this.review.release({ id, ifMatch, by }), by);
  }

  @Post('waivers')
  @HttpCode(200)
  @Roles('steward')
  @ApiOperation({ summary: 'Waive warnings with a reason; errors cannot be waived' })
  waive(
    @Param('id') id: string,
    @Headers('if-match') ifMatch: string,
    @Body() body: WaiverDto,
    @SignedIn() by: Person,
  ) {
    return this.answer(this.review.waive({ id, ifMatch, by }, body.findingKeys, body.reason), by);
  }

  @Post('queries')
  @HttpCode(200)
  @Roles('steward')
  @ApiOperation({ summary: 'Pin a query to a cell' })
  ask(
    @Param('id') id: string,
    @Headers('if-match') ifMatch: string,
    @Body() body: QueryDto,
    @SignedIn() by: Person,
  ) {
    return this.answer(this.review.ask({ id, ifMatch, by }, body), by);
  }

  @Post('queries/:queryId/replies')
  @HttpCode(200)
  @Roles('scientist', 'steward')
  @ApiOperation({ summary: 'Answer a query' })
  reply(
    @Param('id') id: string,
    @Param('queryId') queryId: string,
    @Headers('if-match') ifMatch: string,
    @Body() body: ReplyDto,
    @SignedIn() by: Person,
  ) {
    return this.answer(this.review.reply({ id, ifMatch, by }, queryId, body.text), by);
  }

  @Post('decision')
  @HttpCode(200)
  @Roles('steward')
  @ApiOperation({ summary: 'Approve, return or decline; an approval makes a dataset version' })
  decide(
    @Param('id') id: string,
    @Headers('if-match') ifMatch: string,
    @Body() body: DecisionDto,
    @SignedIn() by: Person,
  ) {
    return this.answer(this.decisions.decide({ id, ifMatch, by }, body), by);
  }

  private async answer(changed: Promise<SubmissionRow>, by: Person): Promise<SubmissionDetail> {
    return this.views.detail(await changed, by);
  }
}
