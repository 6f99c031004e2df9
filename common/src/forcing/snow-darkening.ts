import { requireWithin, type Caution } from '../physical/domain-error';

export interface SnowDarkeningInput {
  /** dust that falls with the snow [g m⁻² yr⁻¹] */
  depositionGM2Yr: number;
  /** snow that falls [kg water m⁻² yr⁻¹] */
  accumulationKgM2Yr: number;
  /** surface of the snow grains per mass [m² kg⁻¹]: 60 fresh, 10 old, 2 melting */
  specificSurfaceM2PerKg: number;
}

export interface SnowDarkening {
  /** dust per mass of snow [10⁻⁶] */
  dustPpm: number;
  /** change of broadband albedo, 0 or below: middle, and the ends that the dust's strength against soot leaves */
  albedoChange: number;
  albedoChangeLowest: number;
  albedoChangeHighest: number;
  cautions: Caution[];
}

/** Grams of dust that darken as much as one of soot: middle, and the range met in the literature (from memory). */
const DUST_PER_SOOT = { middle: 100, strongest: 50, weakest: 200 };

/**
 * Darkening of deep snow by dust, as a change of albedo for `simple-albedo`: a term of its own, never part of the
 * direct effect of dust in the air.
 *
 *   Δα = −c^0.55 / (0.16 + 0.6 S^0.5 + 1.8 c^0.6 S^(−0.25))
 *
 * c soot per mass of snow [10⁻⁶], S surface of the grains per mass [cm² g⁻¹ = 0.1 m² kg⁻¹]; dust counts as 1/100 of
 * its mass of soot, with 1/50 and 1/200 as the ends of the interval.
 *
 * Limits: clean, deep, flat snow in daylight. Melt concentrates or washes out dust; grain growth by dust, algae, black
 * carbon and burial are left out; the relation was made for soot up to 2 ppm, that is dust up to about 200 ppm.
 * Source: Gardner & Sharp (2010), J. Geophys. Res. 115, F01009, for the relation with soot (from memory); the ratio of
 * dust to soot after Warren (1982), Rev. Geophys. 20, 67–89 (from memory).
 */
export function snowDarkening(input: SnowDarkeningInput): SnowDarkening {
  requireWithin('depositionGM2Yr', input.depositionGM2Yr, 'g m⁻² yr⁻¹', 0, 10_000);
  requireWithin('accumulationKgM2Yr', input.accumulationKgM2Yr, 'kg m⁻² yr⁻¹', 1, 20_000);
  requireWithin('specificSurfaceM2PerKg', input.specificSurfaceM2PerKg, 'm² kg⁻¹', 1, 100);
  const dustPpm = (1000 * input.depositionGM2Yr) / input.accumulationKgM2Yr;
  const at = (dustPerSoot: number) =>
    darkeningBySoot(dustPpm / dustPerSoot, 10 * input.specificSurfaceM2PerKg);
  return {
    dustPpm,
    albedoChange: at(DUST_PER_SOOT.middle),
    albedoChangeLowest: at(DUST_PER_SOOT.strongest),
    albedoChangeHighest: at(DUST_PER_SOOT.weakest),
    cautions: dustPpm > 0 ? cautionsOf(dustPpm) : [],
  };
}

function darkeningBySoot(sootPpm: number, surfaceCm2PerG: number): number {
  if (sootPpm === 0) return 0;
  return (
    -(sootPpm ** 0.55) /
    (0.16 + 0.6 * Math.sqrt(surfaceCm2PerG) + 1.8 * sootPpm ** 0.6 * surfaceCm2PerG ** -0.25)
  );
}

function cautionsOf(dustPpm: number): Caution[] {
  const found: Caution[] = [
    {
      code: 'snow-darkening-from-memory',
      message:
        'Snow darkening by a relation quoted from memory, for clean, deep, flat snow in daylight: melt, grain growth, algae, black carbon and burial are left out.',
    },
  ];
  if (dustPpm > 200) {
    found.push({
      code: 'snow-darkening-beyond-range',
      message: `Dust of ${dustPpm.toPrecision(3)} ppm in snow is beyond the 200 ppm that the relation was made for${dustPpm > 1000 ? ', and by far' : ''}.`,
    });
  }
  return found;
}
