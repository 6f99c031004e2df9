import type { EstimateDetail } from '@siltlight/common/wire/estimates';
import { lazy, Suspense } from 'react';
import { Link } from 'react-router-dom';
import { LoadingRows } from '../../shared/feedback/loading';
import { Figure } from '../../shared/figure/figure';
import { formatNumber } from '../../shared/number/format';
import { formatDateTime } from '../../shared/number/time';
import { methodFormulas } from './method-formulas';
import { methodName } from './method-words';

const Tex = lazy(() => import('./tex'));

/** How the number came about: pinned inputs, formula, seed, checksum. */
export function Basis({ estimate }: { estimate: EstimateDetail }) {
  const { request } = estimate;
  const method = methodFormulas[request.method];
  return (
    <Figure plain title="How it was computed" sub={methodName(request.method)}>
      <div className="fold-formula" tabIndex={0} role="region" aria-label={`Formula of ${method.title}`}>
        <Suspense fallback={<LoadingRows rows={1} />}>
          <Tex formula={method.formula} label={`Formula of ${method.title}`} />
        </Suspense>
      </div>
      <ul className="basis">
        <li className="sl-muted">{method.source}.</li>
        <li>
          Air: <Link to={`/fields/${request.fieldVersionId}`}>{estimate.fieldTitle}</Link>. Optics:{' '}
          {estimate.opticalSetTitle}. Ground and cloud: {estimate.backdropTitle}.
        </li>
        <li>
          {request.method !== 'efficiency' &&
            `Transmittance ${formatNumber(request.transmittance, { decimals: 2 })}. `}
          Longwave{' '}
          {request.longwave.on
            ? `by efficiency, ${formatNumber(request.longwave.efficiencyWm2, { figures: 3, signed: true })} W/m² per unit optical depth`
            : 'left out'}
          . {request.members} members, seed {request.seed}.
        </li>
        <li>
          Asked for by {estimate.createdBy.name}, {formatDateTime(estimate.createdAt)}.
          {estimate.publishedBy &&
            estimate.publishedAt &&
            ` Signed off by ${estimate.publishedBy.name}, ${formatDateTime(estimate.publishedAt)}.`}
        </li>
        {estimate.checksum && <li className="basis-checksum">SHA-256 {estimate.checksum}</li>}
      </ul>
    </Figure>
  );
}
