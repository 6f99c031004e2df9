import type { EstimateResult } from '@siltlight/common/wire/estimates';
import { IntervalLadder } from '../../shared/chart/interval-ladder';
import { QuantileDots } from '../../shared/chart/quantile-dots';
import { ErrorState } from '../../shared/feedback/error-state';
import { ExplainedCautions } from '../../shared/feedback/explained-cautions';
import { LoadingFigure } from '../../shared/feedback/loading';
import { formatForcing } from '../../shared/number/format';
import { ForcingUnit } from '../../shared/number/unit';
import { BigNumber } from './big-number';
import { labelLine, largestOf } from './result-words';
import type { SinceChange } from './since-change';

type Props = {
  result: EstimateResult | undefined;
  waiting: boolean;
  complete: boolean;
  error: unknown;
  since: SinceChange | null;
  onRetry: () => void;
};

/** What the set-up would give, from few members, while it is being changed. */
export function PreviewPane({ result, waiting, complete, error, since, onRetry }: Props) {
  return (
    <aside className={waiting ? 'preview waiting' : 'preview'} aria-label="Live preview" aria-busy={waiting}>
      <div className="preview-head">
        <b>Live preview</b>
        <span className="sl-small sl-muted" role="status">
          {waiting ? 'computing' : result && complete ? 'from few members' : ''}
        </span>
      </div>
      {!complete && (
        <p className="sl-13 sl-second">Pick a field, optics and ground: the result shows here at once.</p>
      )}
      {complete && Boolean(error) && (
        <ErrorState error={error} kept="Your set-up is kept in the address." retry={onRetry} />
      )}
      {complete && !error && !result && <LoadingFigure height={300} />}
      {complete && !error && result && <PreviewResult result={result} since={since} />}
    </aside>
  );
}

const LARGEST = 5;

function PreviewResult({ result, since }: { result: EstimateResult; since: SinceChange | null }) {
  const net = result.global.forcing.netWm2;
  const largest = [...result.regions]
    .sort((a, b) => Math.abs(b.forcing.netWm2.value) - Math.abs(a.forcing.netWm2.value))
    .slice(0, LARGEST);
  return (
    <>
      <BigNumber of={net} />
      <p className="estimate-label">{labelLine(result)}.</p>
      <ExplainedCautions of={result.cautions} first={2} />
      {result.outcomes.length > 0 && (
        <QuantileDots
          outcomes={result.outcomes}
          low={net.low ?? net.value}
          median={net.value}
          high={net.high ?? net.value}
          limitWm2={largestOf(result.outcomes)}
        />
      )}
      <h3>Largest regions, 5–95 %</h3>
      <IntervalLadder
        unitInWords="watts per square metre"
        labelPx={142}
        rowPx={21}
        rungs={largest.map((region, at) => ({
          label: region.name,
          value: region.forcing.netWm2.value,
          low: region.forcing.netWm2.low,
          high: region.forcing.netWm2.high,
          first: at === 0,
        }))}
      />
      {since && <Since since={since} />}
    </>
  );
}

function Since({ since: { changes, differenceWm2 } }: { since: SinceChange }) {
  const small = Math.abs(differenceWm2) < 0.005;
  return (
    <p className="preview-change" aria-live="polite">
      <b>Since the last change</b> {changes.join(', ')}: <b>{formatForcing(differenceWm2)}</b> <ForcingUnit />
      {small ? ', next to nothing.' : differenceWm2 < 0 ? ', towards cooling.' : ', towards warming.'}
    </p>
  );
}
