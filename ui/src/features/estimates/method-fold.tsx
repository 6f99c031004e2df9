import { Field, Input, Radio, RadioGroup } from '@fluentui/react-components';
import type { EstimateMethodId } from '@siltlight/common/wire/estimates';
import { lazy, Suspense } from 'react';
import { LoadingRows } from '../../shared/feedback/loading';
import { FormField } from '../../shared/form/form-field';
import { Unit } from '../../shared/number/unit';
import { methodFormulas } from './method-formulas';
import { methodPhrases } from './method-words';
import { NumberField } from './number-field';
import type { FoldProps } from './set-up-folds';

const Tex = lazy(() => import('./tex'));
const ids = Object.keys(methodPhrases) as EstimateMethodId[];

/** Method with its formula and source, size of the ensemble, seed and title. */
export function MethodFold({ setUp, problem, onChange }: FoldProps) {
  const method = methodFormulas[setUp.method];
  return (
    <>
      <Field label="Method">
        <RadioGroup
          value={setUp.method}
          onChange={(_, data) => onChange({ method: data.value as EstimateMethodId })}
        >
          {ids.map((id) => (
            <Radio
              key={id}
              value={id}
              label={
                <>
                  {methodPhrases[id].name}{' '}
                  <span className="sl-small sl-muted">{methodPhrases[id].suits}</span>
                </>
              }
            />
          ))}
        </RadioGroup>
      </Field>
      <div className="fold-formula" tabIndex={0} role="region" aria-label={`Formula of ${method.title}`}>
        <Suspense fallback={<LoadingRows rows={1} />}>
          <Tex formula={method.formula} label={`Formula of ${method.title}`} />
        </Suspense>
      </div>
      <p className="sl-small sl-muted">{method.source}. Positive warms.</p>
      <div className="fold-grid">
        {setUp.method === 'efficiency' && (
          <NumberField
            name="shortwaveEfficiency"
            sentAs="shortwaveEfficiencyWm2"
            label={
              <>
                Shortwave efficiency, <Unit of="W m-2" /> per unit optical depth
              </>
            }
            hint="Starts at −13, all sky: implied by Kok et al. 2023, from memory."
            value={setUp.shortwaveEfficiency}
            problem={problem}
            onChange={(shortwaveEfficiency) => onChange({ shortwaveEfficiency })}
          />
        )}
        <NumberField
          name="members"
          sentAs="members"
          label="Members"
          hint="64 to 4096 sets of varied inputs."
          value={setUp.members}
          problem={problem}
          onChange={(members) => onChange({ members })}
        />
        <NumberField
          name="seed"
          sentAs="seed"
          label="Seed"
          hint="The same seed gives the same numbers."
          value={setUp.seed}
          problem={problem}
          onChange={(seed) => onChange({ seed })}
        />
        <FormField name="title" problem={problem} label="Title" hint="Left empty, the slices name it.">
          <Input
            maxLength={200}
            value={setUp.title}
            onChange={(_, data) => onChange({ title: data.value })}
          />
        </FormField>
      </div>
    </>
  );
}
