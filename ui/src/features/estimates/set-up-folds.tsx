import type { BackdropView, OpticalSetView } from '@siltlight/common/wire/estimates';
import type { FieldDetail } from '@siltlight/common/wire/slices';
import { useState } from 'react';
import type { ApiProblem } from '../../shared/api/api-problem';
import { counted } from '../../shared/number/format';
import { AirFold } from './air-fold';
import { Fold } from './fold';
import { GroundFold } from './ground-fold';
import { MethodFold } from './method-fold';
import { OpticsFold } from './optics-fold';
import { airSentence, groundSentence, methodSentence, opticsSentence, Say } from './sentences';
import type { SetUp } from './set-up';

export type FoldProps = {
  setUp: SetUp;
  problem: ApiProblem | null;
  onChange: (change: Partial<SetUp>) => void;
};

type Props = FoldProps & { fields: FieldDetail[]; sets: OpticalSetView[]; backdrops: BackdropView[] };
type FoldName = 'air' | 'optics' | 'ground' | 'method';

/** Where the service reports the faults of a fold. */
const sentBy: Record<FoldName, string[]> = {
  air: ['fieldVersionId'],
  optics: ['opticalSetVersionId', 'longwave.efficiencyWm2'],
  ground: ['backdropVersionId', 'transmittance'],
  method: ['method', 'members', 'seed', 'title', 'shortwaveEfficiencyWm2'],
};

/** The four questions of an estimate. A fold with a fault cannot be closed over it. */
export function SetUpFolds({ fields, sets, backdrops, ...given }: Props) {
  const { setUp, problem } = given;
  const field = fields.find((one) => one.versionId === setUp.field);
  const set = sets.find((one) => one.versionId === setUp.optics);
  const backdrop = backdrops.find((one) => one.versionId === setUp.backdrop);
  const [opened, setOpened] = useState<ReadonlySet<FoldName>>(
    () => new Set<FoldName>([...(field ? [] : (['air'] as const)), 'optics']),
  );
  const fold = (name: FoldName) => ({
    open: opened.has(name) || sentBy[name].some((sent) => problem?.at(sent)),
    onToggle: () =>
      setOpened((before) => {
        const next = new Set(before);
        if (!next.delete(name)) next.add(name);
        return next;
      }),
  });
  return (
    <div className="folds">
      <Fold
        number={1}
        question="What air"
        sentence={<Say sentence={airSentence(field)} />}
        source={field && airSource(field)}
        {...fold('air')}
      >
        <AirFold fields={fields} {...given} />
      </Fold>
      <Fold
        number={2}
        question="What optics"
        sentence={<Say sentence={opticsSentence(set, setUp)} />}
        source={set && 'The same optics in both slices: an assumption, listed in the record.'}
        {...fold('optics')}
      >
        <OpticsFold sets={sets} {...given} />
      </Fold>
      <Fold
        number={3}
        question="What ground and cloud"
        sentence={<Say sentence={groundSentence(backdrop, setUp)} />}
        source="Ground and cloud of the slice equal those of the reference: an assumption, listed in the record."
        {...fold('ground')}
      >
        <GroundFold backdrops={backdrops} {...given} />
      </Fold>
      <Fold
        number={4}
        question="How computed"
        sentence={<Say sentence={methodSentence(setUp)} />}
        {...fold('method')}
      >
        <MethodFold {...given} />
      </Fold>
    </div>
  );
}

function airSource(field: FieldDetail): string {
  const superseded = field.datasetVersions.filter(({ state }) => state !== 'published').length;
  return `${counted(field.datasetVersions.length, 'dataset version')}, ${superseded === 0 ? 'none superseded' : `${superseded} no longer in force`}`;
}
