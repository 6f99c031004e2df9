import { PRECISIONS } from '@siltlight/common/optics/mode-scattering';
import { ExplainedCautions } from '../../shared/feedback/explained-cautions';
import { formatNumber } from '../../shared/number/format';
import { Unit } from '../../shared/number/unit';
import type { SpeciesName } from '@siltlight/common/wire/optics';
import type { Curves } from './optics-curves';
import type { Drawn } from './use-curves';

const SPHERES = {
  code: 'spheres',
  message: 'Computed for spheres: extinction per mass runs low and asymmetry off for real dust.',
};
const ONE_INDEX = {
  code: 'single-index',
  message:
    'One refractive index does not stand for the world: k of soils at 0.52 µm spans 0.0006 to 0.0048 (Di Biagio et al. 2019).',
};

/** Values at 0.55 µm, how exactly they are known now, and what to be careful about. */
export function SummaryLine({ drawn, species }: { drawn: Drawn | undefined; species: SpeciesName }) {
  const curves = drawn?.curves;
  if (!curves) return <p className="optics-summary sl-muted">Computing the first curves.</p>;
  const { at550 } = curves;
  const cautions = [...(species === 'dust' ? [SPHERES, ONE_INDEX] : []), ...at550.cautions];
  return (
    <>
      <p className="optics-summary">
        At 0.55 µm: extinction <b>{formatNumber(at550.massExtinctionM2PerG, { decimals: 3 })}</b>{' '}
        <Unit of="m2 g-1" />, albedo <b>{formatNumber(at550.singleScatteringAlbedo, { decimals: 4 })}</b>,
        asymmetry <b>{formatNumber(at550.asymmetry, { decimals: 3 })}</b>
        {at550.effectiveRadiusUm !== null && (
          <>
            , effective radius <b>{formatNumber(at550.effectiveRadiusUm, { figures: 3 })}</b> µm
          </>
        )}
        .
      </p>
      <p className="sl-small sl-muted" role="status">
        {precisionText(curves)}
      </p>
      <ExplainedCautions of={cautions} />
    </>
  );
}

function precisionText({ precision }: Curves): string {
  const { points, relativeError, relativeErrorTransparent } = PRECISIONS[precision];
  const error = `error within ${percent(relativeError)} (${percent(relativeErrorTransparent)} where nothing absorbs)`;
  return precision === 'fast'
    ? `Preview with ${points} sizes a mode, ${error}; refined when typing rests.`
    : `Refined, ${points} sizes or more a mode, ${error}.`;
}

const percent = (share: number) => `${Number((100 * share).toPrecision(2))} %`;
