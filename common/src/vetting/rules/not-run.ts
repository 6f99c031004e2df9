import type { Rule, Severity, Stage } from '../rule';

const FIELD = 'Runs when a field is built from dataset versions: it needs the bounds of a time slice.';

/**
 * Rules of field practice that cannot run on a submission, each with its reason. They are listed so that the
 * rule page shows all of them; one that comes to be built gets its own file and leaves this list.
 */
export const notRunRules: Rule[] = [
  later('V14', 'elevation-relief', 'Elevation far from the relief of its place', 'warning', 'submission', {
    needs: ['elevationM', 'latitudeDeg', 'longitudeDeg'],
    why: 'An elevation that does not fit its place means that one of the two is wrong.',
    notRun: 'Not run: no global relief model is shipped.',
  }),
  later('V19', 'age-bounds', 'Age bounds exchanged or outside the slice', 'error', 'field', {
    needs: ['ageYoungKaBp', 'ageOldKaBp'],
    why: 'A sample partly outside a slice may only count with its share.',
    notRun: FIELD,
  }),
  later('V20', 'slice-coverage', 'Slice covered by less than half', 'warning', 'field', {
    needs: ['ageYoungKaBp', 'ageOldKaBp'],
    why: 'A few samples at one end of a slice do not stand for it.',
    notRun: FIELD,
  }),
  later('V21', 'age-error', 'Age error missing or large against the slice', 'warning', 'field', {
    needs: ['ageSigmaKa'],
    why: 'A sample whose age is off by a quarter of the slice may belong to the next one.',
    notRun: FIELD,
  }),
  later('V23', 'extrapolated-age', 'Age beyond the outermost tie points', 'warning', 'submission', {
    needs: ['tie points'],
    why: 'Fluxes at the extrapolated ends of an age model are unreliable.',
    notRun: 'Not run: a submission does not carry its tie points.',
  }),
  later('V24', 'tie-points', 'Fewer than two tie points at the slice', 'warning', 'field', {
    needs: ['tie points'],
    why: 'With one tie point the sedimentation rate inside a slice is a guess.',
    notRun: 'Runs when a field is built, once dataset versions carry tie points.',
  }),
  later('V28', 'hiatus', 'Declared gap inside the slice', 'error', 'field', {
    needs: ['gaps of the record'],
    why: 'Across a gap in the record the flux is not defined.',
    notRun: 'Runs when a field is built, once dataset versions carry declared gaps.',
  }),
  later('V38', 'slice-ratio', 'Ratio of slice to reference outside 0.1 to 50', 'warning', 'field', {
    needs: ['fluxGM2Yr'],
    source: 'largest polar ratios are about 25',
    why: 'A ratio beyond that of the poles is mostly a fault in one of its two means.',
    notRun: FIELD,
  }),
  later('V47', 'river-mouth', 'Near a large river mouth or on a margin', 'warning', 'submission', {
    needs: ['latitudeDeg', 'longitudeDeg'],
    source: 'flagged in global compilations',
    why: 'River mud and turbidites count as dust in every chemical or weighed flux.',
    notRun: 'Not run: no list of river mouths is shipped.',
  }),
  later('V60', 'slice-mean', 'Slice mean not weighted by duration', 'warning', 'field', {
    needs: ['fluxGM2Yr'],
    why: 'The arithmetic mean weighted by time conserves mass; a mean of logarithms does not.',
    notRun: FIELD,
  }),
  later('V67', 'depth-against-load', 'Optical depth and load do not fit', 'warning', 'field', {
    needs: ['aod'],
    why: 'Optical depth over load is the mass extinction efficiency, 0.1 to 2.5 m2 g-1 for dust.',
    notRun: 'Runs when a field is built that holds both optical depth and load.',
  }),
  later('V68', 'depth-against-deposition', 'Optical depth and deposition do not fit', 'note', 'field', {
    needs: ['aod', 'fluxGM2Yr'],
    why: 'Deposition times lifetime times extinction efficiency closes the chain within a factor of five.',
    notRun: 'Runs when a field is built that holds both optical depth and deposition.',
  }),
  later('V73', 'bright-surface', 'Retrieval over bright ground without algorithm', 'warning', 'submission', {
    needs: ['method'],
    why: 'Over deserts and ice the retrieved depth depends on the algorithm.',
    notRun: 'Not run: no map of bright ground is shipped.',
  }),
  later('V74', 'calendar', 'Calendar or time bounds of a grid wrong', 'error', 'grid', {
    needs: ['gridded file'],
    source: 'CF Conventions 1.11',
    why: 'A 29 February in a calendar without one shifts every later month.',
    notRun: 'Runs when a gridded file is uploaded.',
  }),
  later('V75', 'grid-area', 'Area or mean of a grid wrong', 'error', 'grid', {
    needs: ['gridded file'],
    source: 'area of the sphere, 5.10e14 m2',
    why: 'Weights that do not add up to the Earth give every mean the wrong size.',
    notRun: 'Runs when a gridded file is uploaded.',
  }),
  later('V76', 'ratio-kinds', 'Ratio of unlike slices or size cut-offs', 'error', 'field', {
    needs: ['sizeCutoff'],
    why: 'A ratio of bulk to fine flux is not a change in dust.',
    notRun: FIELD,
  }),
];

function later(
  id: string,
  slug: string,
  title: string,
  severity: Severity,
  stage: Stage,
  rest: { needs: string[]; why: string; notRun: string; source?: string },
): Rule {
  const { source = 'common practice, no source', ...more } = rest;
  return { id, slug, title, severity, stage, source, ...more, check: () => [] };
}
