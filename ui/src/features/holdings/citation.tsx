import { Button } from '@fluentui/react-components';
import { ArrowDownload16Regular, Copy16Regular } from '@fluentui/react-icons';
import type { DatasetVersionDetail } from '@siltlight/common/wire/datasets';
import { useSay } from '../../shared/feedback/toasts';
import { Figure } from '../../shared/figure/figure';
import { versionFile } from './queries';
import { descriptionOf } from './wording';

/** How to cite the version, what its form says, and its files. */
export function Citation({ detail }: { detail: DatasetVersionDetail }) {
  const say = useSay();
  const { slug, version, citation, metadata } = detail;
  const copy = () =>
    navigator.clipboard.writeText(citation).then(
      () => say('Citation copied'),
      () => say('The browser refused to copy', 'Select the text and copy it by hand.', 'warning'),
    );
  return (
    <Figure
      plain
      title="Cite this version"
      controls={
        <Button size="small" appearance="transparent" icon={<Copy16Regular />} onClick={() => void copy()}>
          Copy
        </Button>
      }
    >
      <blockquote className="citation">{citation}</blockquote>
      <dl className="description">
        {metadata.creators?.map((creator) => (
          <Line key={creator.name} label="Creator">
            {creator.name}
            {creator.orcid && (
              <>
                {' '}
                <a href={`https://orcid.org/${creator.orcid}`} rel="noreferrer">
                  ORCID {creator.orcid}
                </a>
              </>
            )}
            {creator.affiliation && <span className="sl-muted">, {creator.affiliation}</span>}
          </Line>
        ))}
        {descriptionOf(detail).map(({ key, label, text }) => (
          <Line key={key} label={label}>
            {key === 'publicationDoi' ? (
              <a href={`https://doi.org/${text}`} rel="noreferrer">
                {text}
              </a>
            ) : (
              text
            )}
          </Line>
        ))}
        <Line label="Checksum">
          <span className="checksum">{version.checksum}</span>
        </Line>
      </dl>
      <ul className="downloads" aria-label="Files of this version">
        {(
          [
            ['file', `File as sent: ${detail.file.fileName}`, undefined],
            ['content', 'Canonical content, JSON', `${slug}-${version.number}.json`],
            ['provenance', 'Provenance, W3C PROV', `${slug}-${version.number}-provenance.json`],
          ] as const
        ).map(([part, label, name]) => (
          <li key={part}>
            <ArrowDownload16Regular aria-hidden />
            <a href={versionFile(slug, version.number, part)} download={name ?? true}>
              {label}
            </a>
          </li>
        ))}
      </ul>
    </Figure>
  );
}

const Line = ({ label, children }: { label: string; children: React.ReactNode }) => (
  <>
    <dt>{label}</dt>
    <dd>{children}</dd>
  </>
);
