import {
  ChevronRight16Regular,
  DatabaseCheckmark20Regular,
  DocumentTable20Regular,
  GlobeSurface20Regular,
  Layer20Regular,
  MailInboxCheckmark20Regular,
  type FluentIcon,
} from '@fluentui/react-icons';
import type { DatasetVersionDetail } from '@siltlight/common/wire/datasets';
import type { ReactNode } from 'react';
import { Link } from 'react-router-dom';
import { counted, formatBytes } from '../../shared/number/format';
import { formatDate } from '../../shared/number/time';
import { shortSum, versionFile } from './queries';

type Step = { icon: FluentIcon; title: ReactNode; note: string; here?: boolean };

/** From the file to what stands on this version: each step leads to its page. */
export function Trail({ detail }: { detail: DatasetVersionDetail }) {
  const { slug, version, file, submission, usedBy } = detail;
  const fields = usedBy.filter(({ kind }) => kind === 'field');
  const estimates = usedBy.filter(({ kind }) => kind === 'estimate');
  const steps: Step[] = [
    {
      icon: DocumentTable20Regular,
      title: <a href={versionFile(slug, version.number, 'file')}>{file.fileName}</a>,
      note: `${formatBytes(file.bytes)}, sha-256 ${shortSum(file.sha256)}`,
    },
    ...(submission
      ? [
          {
            icon: MailInboxCheckmark20Regular,
            title: <Link to={`/intake/${submission.id}`}>Submission {submission.number}</Link>,
            note: version.publishedBy ? `approved by ${version.publishedBy.name}` : 'approved',
          },
        ]
      : []),
    {
      icon: DatabaseCheckmark20Regular,
      title: `Version ${version.number}`,
      note: `${version.publishedAt ? `${formatDate(version.publishedAt)}, ` : ''}sha-256 ${shortSum(version.checksum)}`,
      here: true,
    },
    {
      icon: GlobeSurface20Regular,
      title: fields[0] ? (
        <Link to={`/fields/${fields[0].id}`}>{countOr(fields, 'field')}</Link>
      ) : (
        'No field yet'
      ),
      note: fields.length > 0 ? 'of time slices' : 'stands on it',
    },
    {
      icon: Layer20Regular,
      title: estimates[0] ? (
        <Link to={`/estimates/${estimates[0].id}`}>{countOr(estimates, 'estimate')}</Link>
      ) : (
        'No estimate yet'
      ),
      note: estimates.length > 0 ? 'of forcing' : 'rests on it',
    },
  ];
  return (
    <ol className="trail" aria-label="Where this version comes from and where it goes">
      {steps.map(({ icon: Icon, title, note, here }, at) => (
        <li key={at} className={here ? 'here' : undefined} aria-current={here ? 'step' : undefined}>
          <Icon aria-hidden />
          <span>
            <b>{title}</b>
            <small>{note}</small>
          </span>
          {at < steps.length - 1 && <ChevronRight16Regular className="trail-arrow" aria-hidden />}
        </li>
      ))}
    </ol>
  );
}

const countOr = (list: readonly { title: string }[], noun: string) =>
  list.length === 1 ? list[0]!.title : counted(list.length, noun);
