import { Unit } from '../../shared/number/unit';
import { BandsFigure } from './bands-figure';
import { HumidityFigure } from './humidity-figure';
import { PhaseFigures } from './phase-figures';
import type { ShownSet } from './shown-set';
import { SpectrumFigure } from './spectrum-figure';

/** Spectra, phase function and bands of the set at work, beside those it is compared with. */
export function SetFigures({ sets }: { sets: readonly ShownSet[] }) {
  const own = sets[0]!;
  return (
    <>
      <div className="optics-spectra">
        <SpectrumFigure
          sets={sets}
          quantity="massExtinctionM2PerG"
          title="Mass extinction efficiency"
          sub={<Unit of="m2 g-1" />}
          unit="m2 g-1"
        />
        <SpectrumFigure
          sets={sets}
          quantity="singleScatteringAlbedo"
          title="Single-scattering albedo"
          sub="no unit"
          unit=""
          yDomain={[0, 1]}
        />
        <SpectrumFigure sets={sets} quantity="asymmetry" title="Asymmetry parameter" sub="no unit" unit="" />
      </div>
      <p className="sl-small sl-muted">
        Axis: wavelength in µm. Band: range when all radii or k are moved by their stated factors, one at a
        time. Dashed: 0.55 µm, where optical depths are stated.
      </p>
      {sets.some((set) => set.definition) && (
        <div className="optics-phase">
          <PhaseFigures sets={sets} />
        </div>
      )}
      <HumidityFigure sets={sets} />
      {own.curves && <BandsFigure bands={own.curves.bands} />}
    </>
  );
}
