import { Injectable } from '@nestjs/common';
import { InjectModel } from '@nestjs/sequelize';
import type { Page } from '@siltlight/common/wire/shared';
import type { FindingView, submissionsQuery, SubmissionSummary } from '@siltlight/common/wire/submissions';
import { Op, type WhereOptions } from 'sequelize';
import type { z } from 'zod';
import type { Person } from '../auth/policy';
import { numberOfCursor, pageOf } from '../http/paging';
import { SubmissionRow } from './models/submission-row';
import { SubmissionViews } from './submission-views.service';

type Query = z.infer<typeof submissionsQuery> & { limit: number; cursor?: string | undefined };

const QUEUE = ['submitted', 'in-review'];

/** Lists of submissions and of their findings. */
@Injectable()
export class SubmissionsService {
  constructor(
    @InjectModel(SubmissionRow) private readonly submissions: typeof SubmissionRow,
    private readonly views: SubmissionViews,
  ) {}

  /** The queue is oldest first; other lists newest first. */
  async list(query: Query, reader: Person): Promise<Page<SubmissionSummary>> {
    const oldestFirst = query.queue === 'true';
    const mine = query.mine === 'true' ? { contributorId: reader.id } : {};
    const where = { [Op.and]: [selection(query), mine, visibleTo(reader)] };
    const page = await pageOf(query, {
      fetch: (count, after) => {
        const beyond =
          after === undefined ? {} : { number: { [oldestFirst ? Op.gt : Op.lt]: numberOfCursor(after) } };
        return this.submissions.findAll({
          where: { [Op.and]: [where, beyond] },
          order: [['number', oldestFirst ? 'ASC' : 'DESC']],
          limit: count,
        });
      },
      count: () => this.submissions.count({ where }),
      keyOf: ({ number }) => String(number),
      toItem: (row) => row,
    });
    return { ...page, items: await Promise.all(page.items.map((row) => this.views.summary(row))) };
  }
}

function selection({ state, queue }: Query): WhereOptions {
  return {
    ...(state ? { state } : {}),
    ...(queue === 'true' ? { state: QUEUE } : {}),
  };
}

function visibleTo({ id, roles }: Person): WhereOptions {
  const own = { contributorId: id };
  return roles.includes('steward') ? { [Op.or]: [own, { submittedAt: { [Op.ne]: null } }] } : own;
}

export function selectFindings(
  all: FindingView[],
  {
    severity,
    code,
    offset,
    limit,
  }: { severity?: string | undefined; code?: string | undefined; offset: number; limit: number },
) {
  const wanted = all.filter(
    (finding) => (!severity || finding.severity === severity) && (!code || finding.code === code),
  );
  return { total: wanted.length, items: wanted.slice(offset, offset + limit), byRule: byRule(all) };
}

function byRule(findings: FindingView[]) {
  const groups = new Map<
    string,
    { code: string; slug: string; title: string; severity: string; count: number }
  >();
  for (const { code, slug, title, severity } of findings) {
    const key = `${code} ${severity}`;
    const group = groups.get(key) ?? { code, slug, title, severity, count: 0 };
    groups.set(key, { ...group, count: group.count + 1 });
  }
  return [...groups.values()];
}
