/**
 * What a mass flux or concentration is of, told from its heading. Calcium, iron or thorium stand for dust only
 * through a factor that a person states, so a proxy is never called dust.
 */

/** Tracers by the words that head their columns; the first that fits wins (nssCa before Ca). From memory. */
const TRACERS: [RegExp, string][] = [
  [/(?<![a-z])nss[\s_-]*ca/i, 'nssCa'],
  [/(?<![a-z])nss[\s_-]*so4|nss[\s_-]*sulfat|nss[\s_-]*sulphat/i, 'nssSO4'],
  [/(?<![a-z])nss[\s_-]*mg/i, 'nssMg'],
  [/(?<![a-z])ss[\s_-]*na/i, 'ssNa'],
  [/(?<![a-z])ss[\s_-]*ca/i, 'ssCa'],
  [/232[\s-]*th|th[\s-]*232|thorium/i, '232Th'],
  [/230[\s-]*th|th[\s-]*230/i, '230Th'],
  [/(?<![a-z\d])4[\s-]*he|helium/i, '4He'],
  [/(?<![a-z])so4|sulfat|sulphat/i, 'SO4'],
  [/(?<![a-z])ca(?:2\+|\+\+|²⁺)?(?![a-z])|calcium|kalzium/i, 'Ca'],
  [
    /(?<![a-z])fe(?:2\+|3\+)?(?![a-z])|(?<![a-z])iron(?![a-z])|(?<![a-z])eisen|(?<![a-z])fer(?![a-z])|hierro/i,
    'Fe',
  ],
  [/(?<![a-z])al(?:3\+)?(?![a-z])|alumini/i, 'Al'],
  [/(?<![a-z])ti(?![a-z])|titan/i, 'Ti'],
  [/(?<![a-z])na\+?(?![a-z])|sodium|natrium/i, 'Na'],
  [/(?<![a-z])mg2\+|magnesium/i, 'Mg'],
  [/(?<![a-z])k\+(?![a-z])|potassium|kalium/i, 'K'],
  [/(?<![a-z])cl-?(?![a-z])|chlorid/i, 'Cl'],
  [/(?<![a-z])no3/i, 'NO3'],
  [/(?<![a-z])nh4/i, 'NH4'],
  [/(?<![a-z])si(?![a-z])|silic/i, 'Si'],
  [/carbonate|caco3|karbonat/i, 'carbonate'],
  [/opal|biogenic silica/i, 'opal'],
  [/organic carbon|(?<![a-z])toc(?![a-z])/i, 'organic carbon'],
];

const DUST =
  /dust|a?eolian|lithogen|terrigen|detrit|mineral aerosol|loess|l(?:ö|oe)ss|staub|poussi|polvo|polver|poeira|stof|пыл/i;
const BULK =
  /(?<![a-z])(?:bulk|total|gesamt|totale?)\b.*(?:mar|flux|fluss|sediment|accumulation)|sediment(?:ary)? (?:flux|mar|mass)/i;

/** Tracers that estimates of dust have been made from. Sea salt, sulfate and biogenic matter are none of them. */
const DUST_PROXIES = new Set(['nssCa', 'Ca', 'Fe', 'Al', 'Ti', '232Th', '4He', 'nssMg', 'Si']);

/** @returns 'dust', a tracer's symbol, 'bulk sediment', or null when the heading names none of them */
export function fluxQuantityOf(heading: string): string | null {
  const text = heading.replace(/_/g, ' ');
  const tracer = TRACERS.find(([words]) => words.test(text))?.[1] ?? null;
  if (DUST.test(text) && !tracer) return 'dust';
  if (tracer) return tracer;
  return BULK.test(text) ? 'bulk sediment' : null;
}

export const isDustProxy = (quantity: string): boolean => DUST_PROXIES.has(quantity);
