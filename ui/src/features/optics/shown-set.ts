import type { OpticalSetDetail, MeasuredRow } from '@siltlight/common/wire/optics';
import type { ParticleDefinition } from '@siltlight/common/optics/species-optics';
import type { Curves, SpectrumPoint } from './optics-curves';

/** What figures need of a set: the one at work, or one beside it. */
export type ShownSet = {
  key: string;
  title: string;
  /** place in the palette */
  colour: number;
  definition: ParticleDefinition | null;
  curves: Curves | undefined;
  /** Values without particles: measured ones, or bulk values at one wavelength. */
  rows: readonly MeasuredRow[];
};

export const rowsOf = (set: OpticalSetDetail): MeasuredRow[] => {
  if (set.basis.kind === 'measured') {
    return [...set.basis.rows].sort((a, b) => a.wavelengthUm - b.wavelengthUm);
  }
  if (set.basis.kind === 'particles') return [];
  const { wavelengthUm, massExtinctionM2PerG, singleScatteringAlbedo, asymmetry } = set;
  return [{ wavelengthUm, massExtinctionM2PerG, singleScatteringAlbedo, asymmetry }];
};

export const definitionIn = (set: OpticalSetDetail): ParticleDefinition | null =>
  set.basis.kind === 'particles' ? set.basis.definition : null;

export const spectrumOf = (set: ShownSet): readonly SpectrumPoint[] => set.curves?.spectrum ?? set.rows;
