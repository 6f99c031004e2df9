import type { EstimateDetail, EstimateResult } from '@siltlight/common/wire/estimates';
import { IntervalLadder, type Rung } from '../../shared/chart/interval-ladder';
import { QuantileDots } from '../../shared/chart/quantile-dots';
import { ExplainedCautions } from '../../shared/feedback/explained-cautions';
import { BigNumber } from './big-number';
import { headlineOf, labelLine, largestOf } from './result-words';

type Props = { result: EstimateResult; context: EstimateDetail['context'] };

/** The answer: a sentence, the number with its label and cautions, its outcomes, and other terms for scale. */
export function Headline({ result, context }: Props) {
  return (
    <div className="headline">
      <div>
        <p className="headline-say">{headlineOf(result)}</p>
        <BigNumber of={result.global.forcing.netWm2} />
        <p className="estimate-label">{labelLine(result)}</p>
        <ExplainedCautions of={result.cautions} first={2} />
      </div>
      <Outcomes result={result} />
      <Beside result={result} context={context} />
    </div>
  );
}

function Outcomes({ result: { outcomes, global } }: { result: EstimateResult }) {
  const net = global.forcing.netWm2;
  if (outcomes.length === 0) return <div />;
  const below = outcomes.filter((value) => value < 0).length;
  return (
    <div className="headline-dots">
      <QuantileDots
        outcomes={outcomes}
        low={net.low ?? net.value}
        median={net.value}
        high={net.high ?? net.value}
        limitWm2={largestOf(outcomes)}
        heightPx={142}
      />
      <p className="sl-small sl-muted">
        {outcomes.length} equally likely outcomes, {below} below zero. Bar 5–95 %, triangle the value.
      </p>
    </div>
  );
}

/** Rungs beside the estimate; the direct effect is another kind and stands apart with a hollow mark. */
export function besideRungs({ global }: EstimateResult, context: EstimateDetail['context']): Rung[] {
  const { forcing, directEffect } = global;
  const rungs: Rung[] = [{ label: 'Dust, forcing', ...forcing.netWm2, first: true }];
  if (context.greenhouse) rungs.push({ label: 'Greenhouse', value: context.greenhouse.valueWm2 });
  rungs.push({ label: 'Direct effect', ...directEffect.netWm2, other: true });
  return rungs;
}

function Beside({ result, context }: Props) {
  return (
    <div className="headline-beside">
      <h2>Beside it, for scale</h2>
      <IntervalLadder
        rungs={besideRungs(result, context)}
        unitInWords="watts per square metre"
        labelPx={88}
        rowPx={20}
      />
      <p className="sl-small sl-muted">
        Direct effect = slice against no dust: another kind, not to be subtracted by eye.
        {context.greenhouse && ` Greenhouse: ${context.greenhouse.formula}.`}
      </p>
    </div>
  );
}
