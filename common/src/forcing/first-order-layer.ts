/**
 * First order in τ of the change of reflected sunlight, per unit of normal-incidence sunlight and of τ:
 *
 *   b = ω(1−R_s)[β − 2β̄ R_s μ₀] − (1−ω) R_s (1 + 2μ₀),  μ₀ ΔA = τ b,  ΔF = −S τ b
 *
 * It is linear in β and μ₀, so that means of these over sun angles give the mean of b.
 *
 * Source: limit of Coakley & Chylek (1975), J. Atmos. Sci. 32, 409–418; checks/optics/FORMULAS.md §5.
 * Checked against: checks/optics/forcing_local_mu0.csv.
 */
export function firstOrderBracket(
  singleScatteringAlbedo: number,
  surfaceAlbedo: number,
  upscatter: number,
  upscatterMean: number,
  cosSolarZenith: number,
): number {
  const reflected = (1 - surfaceAlbedo) * (upscatter - 2 * upscatterMean * surfaceAlbedo * cosSolarZenith);
  const absorbed = surfaceAlbedo * (1 + 2 * cosSolarZenith);
  return singleScatteringAlbedo * reflected - (1 - singleScatteringAlbedo) * absorbed;
}

/**
 * ω at which the bracket is zero; null where no ω from 0 to 1 makes it so (the layer then warms whatever it absorbs:
 * it darkens ground that reflects a high sun).
 */
export function criticalOfBracket(
  surfaceAlbedo: number,
  upscatter: number,
  upscatterMean: number,
  cosSolarZenith: number,
): number | null {
  const scattering = firstOrderBracket(1, surfaceAlbedo, upscatter, upscatterMean, cosSolarZenith);
  const absorbing = -firstOrderBracket(0, surfaceAlbedo, upscatter, upscatterMean, cosSolarZenith);
  return scattering > 0 ? absorbing / (absorbing + scattering) : null;
}
