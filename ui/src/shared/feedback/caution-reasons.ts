/**
 * Why a caution is raised: what the limit rests on, by the code of the caution. Sources stand in the text; a limit
 * without one says so.
 */
const reasons: Readonly<Record<string, string>> = {
  'few-sites':
    'A region with fewer than three sites has no spread of its own to judge by. Its ratio is drawn towards the global ratio, and its interval is widened. Common practice, no source.',
  'no-site-in-region':
    'No record of the region holds samples in both windows, so the global ratio stands in for it. Ratios differ by region from about 2 to 25 between low latitudes and Antarctica.',
  'few-sites-overall':
    'The spread between regions is estimated from the sites. From few of them it is itself uncertain.',
  'hatched-area':
    'Where no record lies, the ratio is filled by rule. The interval covers that rule only as far as the spread between the sampled regions.',
  'area-filled-by-global-ratio':
    'Ratios differ by region; one global ratio over much of the Earth gets the pattern wrong.',
  'sites-not-used':
    'A ratio needs a flux in both windows, of one quantity and one size fraction. Sites without are listed, not guessed.',
  'same-site-twice':
    'Compilations share cores. One core counted twice weighs double and makes the interval too narrow.',
  'thin-layer-far-beyond-range':
    'The one-layer formula keeps terms of first order in optical depth. Against a multiple-scattering solution its error passes 25 % at these depths (Charlson et al. 1992; Haywood & Shine 1995 for the form).',
  'thin-layer-beyond-range':
    'The one-layer formula is made for optical depths below about 0.1 over dark ground (Charlson et al. 1992; Haywood & Shine 1995).',
  'thin-layer-note':
    'Over dark ground the one-layer formula starts to deviate above an optical depth of 0.03.',
  'near-sign-change':
    'Close to the critical albedo the result is a small difference of large terms, and its sign depends on the single-scattering albedo more than on the amount of dust.',
  'bright-ground':
    'Over snow, ice and bright desert, going from a single-scattering albedo of 0.95 to 0.90 doubles the warming.',
  'cloudy-region':
    'The factor for cloud treats dust above cloud as having no effect. Absorbing dust above bright cloud warms.',
  'strong-absorption':
    'The formula is made for weakly absorbing particles: single-scattering albedo above 0.85.',
  'uncalibrated-formula':
    'With mid-visible optics the formula gives −59 W/m² per unit optical depth over clear ocean; satellites give −33 ± 5 (Christopher & Jones 2008). Expect too much cooling unless broadband optics or a calibrated efficiency are used.',
  'half-day-high-latitude':
    'A factor of one half for daylight hides sun angle and season. Beyond 50° of latitude the daily form with the orbit of the slice is needed.',
  'half-day-per-region':
    'The half-day form is a global-mean formula: by region it hides sun angle, season and latitude.',
  'layer-surface-pair':
    'Layer and ground are paired by region means. Where dust lies over the brightest part of a region only, the true effect differs.',
  'efficiency-out-of-place':
    'An efficiency belongs to its place, season, sky, ground, size mix and optical-depth product: −50 or −37 W/m² in one region by the product alone (Song et al. 2018).',
  'longwave-off':
    'Without longwave the result leans to cooling; over the tropical Atlantic about 30 % of the shortwave effect is offset.',
  'longwave-by-efficiency':
    'Longwave depends on layer height, ground temperature, water vapour and the coarse share. Glacial air was colder and drier; values of today may not carry over.',
  'no-clear-sky-longwave':
    'The longwave efficiency in use belongs to all sky; no clear-sky value follows from it.',
  'interval-covers-varied-inputs':
    'The interval holds what was varied. It does not hold the choice of method, missing processes or regions without records.',
  spheres:
    'The Mie series is exact for spheres only. Dust has more surface for its volume than a sphere and scatters less straight back and more sideways; extinction per mass of real dust is higher. The factor for shape is a first correction of extinction alone; albedo and asymmetry stay those of spheres.',
  'single-index':
    'Iron oxides set the absorption of dust and differ from soil to soil: over 19 soils k at 0.52 µm spans a factor of 8 (Di Biagio et al. 2019). Compare a set of low and one of high absorption before trusting one albedo.',
  'index-constant':
    'Minerals absorb more in the ultraviolet and have strong bands in the infrared, near 9 to 10 µm for silicates (from memory). A typed value is sound near the wavelength it was measured at; for spectra and bands choose a table or a mixture.',
  'humidity-near-saturation':
    'Growth by κ leaves out the curvature of small drops, which at 90 % humidity lowers the diameter by about 3 % at 100 nm dry diameter and 0.3 % at 1 µm (ammonium sulfate; Petters & Kreidenweis 2007 for the form). Near saturation a small error of humidity is a large one of water.',
};

export const reasonOf = (code: string): string | undefined => reasons[code];

const strong: ReadonlySet<string> = new Set(['thin-layer-far-beyond-range', 'strong-absorption']);
export const isStrong = (code: string): boolean => strong.has(code);
