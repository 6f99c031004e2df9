/**
 * Scattering coefficients a_j, b_j of a homogeneous sphere, kept in arrays that are reused from sphere to sphere.
 *
 * With ψ_j, χ_j the Riccati–Bessel functions and E_j(z) = ψ_{j+1}(z)/ψ_j(z), so that the logarithmic derivative is
 * D_j(z) = (j+1)/z − E_j(z):
 *
 *   a_j = N/(N + iC),  N = A ψ_j − ψ_{j−1},  C = A χ_j − χ_{j−1},  A = D_j(mx)/m + j/x   (b_j: A = m D_j(mx) + j/x)
 *
 * - E_j by downward recurrence, stable for every argument, E_{j−1} = 1/((2j+1)/z − E_j).
 * - For j ≥ x the difference in N is taken analytically, N/ψ_j = (j+1)/x (1/m² − 1) + E_j(x) − E_j(mx)/m (for b:
 *   E_j(x) − m E_j(mx)): nothing of order 1/x cancels, so that no separate series is needed for tiny spheres.
 * - ψ_{j−1} χ_j − ψ_j χ_{j−1} = 1 makes Re a − |a|² = Im A / |N + iC|²: absorption is summed by itself, never as a
 *   difference, and is exactly 0 for k = 0.
 *
 * Source: Mie (1908), Ann. Phys. 330, 377–445; number of terms after Wiscombe (1980), Appl. Opt. 19, 1505–1509 (from
 * memory); the forms above are our own arrangement. checks/optics/FORMULAS.md §1.
 * Checked against: checks/optics/mie_sphere.csv, mie_published.csv.
 */
export class MieCoefficients {
  /** number of terms; term j is at index j, index 0 is not used */
  terms = 0;
  aRe = new Float64Array(0);
  aIm = new Float64Array(0);
  bRe = new Float64Array(0);
  bIm = new Float64Array(0);
  /** Re a − |a|² + Re b − |b|² of each term: what it absorbs */
  absorbed = new Float64Array(0);
  private innerRe = new Float64Array(0);
  private innerIm = new Float64Array(0);
  private outer = new Float64Array(0);

  /**
   * Fills the arrays for one sphere.
   *
   * @param x size parameter 2πr/λ, above 0
   * @param n real part of the refractive index, above 0
   * @param k imaginary part, m = n − ik, 0 or more
   */
  compute(x: number, n: number, k: number): void {
    const terms = termCount(x);
    this.reserve(terms);
    this.terms = terms;
    this.fillInner(n * x, -k * x);
    this.fillOuter(x);
    this.fillCoefficients(x, n, k);
  }

  private reserve(terms: number): void {
    if (this.aRe.length > terms) return;
    const length = Math.ceil(terms * 1.3) + 16;
    this.aRe = new Float64Array(length);
    this.aIm = new Float64Array(length);
    this.bRe = new Float64Array(length);
    this.bIm = new Float64Array(length);
    this.absorbed = new Float64Array(length);
    this.innerRe = new Float64Array(length);
    this.innerIm = new Float64Array(length);
    this.outer = new Float64Array(length);
  }

  /** E_j(y) of the complex y = mx for j = 1 … terms. The start beyond |y| forgets its first guess of 0. */
  private fillInner(yRe: number, yIm: number): void {
    const { terms, innerRe, innerIm } = this;
    const size = Math.sqrt(yRe * yRe + yIm * yIm);
    const inverseRe = yRe / (size * size);
    const inverseIm = -yIm / (size * size);
    const start = Math.ceil(Math.max(terms, size) + 8 * Math.cbrt(size) + 12);
    let re = 0;
    let im = 0;
    for (let j = start; j > terms; j -= 1) {
      const denominatorRe = (2 * j + 1) * inverseRe - re;
      const denominatorIm = (2 * j + 1) * inverseIm - im;
      const scale = 1 / (denominatorRe * denominatorRe + denominatorIm * denominatorIm);
      re = denominatorRe * scale;
      im = -denominatorIm * scale;
    }
    for (let j = terms; j >= 1; j -= 1) {
      innerRe[j] = re;
      innerIm[j] = im;
      const denominatorRe = (2 * j + 1) * inverseRe - re;
      const denominatorIm = (2 * j + 1) * inverseIm - im;
      const scale = 1 / (denominatorRe * denominatorRe + denominatorIm * denominatorIm);
      re = denominatorRe * scale;
      im = -denominatorIm * scale;
    }
  }

  /** E_j(x) for j from just below x (where it is positive) to the last term. */
  private fillOuter(x: number): void {
    const { terms, outer } = this;
    const inverse = 1 / x;
    let ratio = 0;
    const first = Math.max(0, Math.floor(x) - 1);
    for (let j = terms + Math.ceil(8 * Math.cbrt(x)) + 12; j > first; j -= 1) {
      if (j <= terms) outer[j] = ratio;
      ratio = 1 / ((2 * j + 1) * inverse - ratio);
    }
    outer[first] = ratio;
  }

  private fillCoefficients(x: number, n: number, k: number): void {
    const { terms, aRe, aIm, bRe, bIm, absorbed, innerRe, innerIm, outer } = this;
    const size2 = n * n + k * k;
    const inverseX = 1 / x;
    const inverseMRe = n / size2; // 1/m = (n + ik)/|m|²
    const inverseMIm = k / size2;
    const inverseM2Re = (n * n - k * k) / (size2 * size2);
    const inverseM2Im = (2 * n * k) / (size2 * size2);
    // 1/m² − 1 = (1 − m)(1 + m)/m², written so that m near 1 keeps its digits
    const contrastRe = ((1 - n) * (1 + n) + k * k) * inverseM2Re - 2 * n * k * inverseM2Im;
    const contrastIm = ((1 - n) * (1 + n) + k * k) * inverseM2Im + 2 * n * k * inverseM2Re;

    let psiBefore = Math.sin(x);
    let chiBefore = Math.cos(x);
    let psiTwoBefore = chiBefore; // ψ₋₁ = cos x, χ₋₁ = −sin x
    let chiTwoBefore = -psiBefore;
    for (let j = 1; j <= terms; j += 1) {
      const below = j < x;
      const factor = (2 * j - 1) * inverseX;
      const chi = factor * chiBefore - chiTwoBefore;
      const psi = below ? factor * psiBefore - psiTwoBefore : psiBefore * outer[j - 1]!;
      const eRe = innerRe[j]!;
      const eIm = innerIm[j]!;
      const overMRe = eRe * inverseMRe - eIm * inverseMIm; // E_j(mx)/m
      const overMIm = eRe * inverseMIm + eIm * inverseMRe;
      const timesMRe = eRe * n + eIm * k; // m E_j(mx)
      const timesMIm = eIm * n - eRe * k;

      const electricRe = (j + 1) * inverseX * inverseM2Re + j * inverseX - overMRe;
      const electricIm = (j + 1) * inverseX * inverseM2Im - overMIm;
      const magneticRe = (2 * j + 1) * inverseX - timesMRe;
      const magneticIm = -timesMIm;

      let electricNRe: number;
      let magneticNRe: number;
      if (below) {
        electricNRe = electricRe * psi - psiBefore;
        magneticNRe = magneticRe * psi - psiBefore;
      } else {
        electricNRe = psi * ((j + 1) * inverseX * contrastRe + outer[j]! - overMRe);
        magneticNRe = psi * (outer[j]! - timesMRe);
      }
      // The imaginary part of 1/m² − 1 is that of 1/m²: N keeps it whatever form its real part takes.
      const electricNIm = psi * (below ? electricIm : (j + 1) * inverseX * contrastIm - overMIm);
      const magneticNIm = psi * magneticIm;

      const electricDRe = electricNRe - electricIm * chi;
      const electricDIm = electricNIm + electricRe * chi - chiBefore;
      const magneticDRe = magneticNRe - magneticIm * chi;
      const magneticDIm = magneticNIm + magneticRe * chi - chiBefore;
      const electricScale = 1 / (electricDRe * electricDRe + electricDIm * electricDIm);
      const magneticScale = 1 / (magneticDRe * magneticDRe + magneticDIm * magneticDIm);
      aRe[j] = (electricNRe * electricDRe + electricNIm * electricDIm) * electricScale;
      aIm[j] = (electricNIm * electricDRe - electricNRe * electricDIm) * electricScale;
      bRe[j] = (magneticNRe * magneticDRe + magneticNIm * magneticDIm) * magneticScale;
      bIm[j] = (magneticNIm * magneticDRe - magneticNRe * magneticDIm) * magneticScale;
      absorbed[j] = electricIm * electricScale + magneticIm * magneticScale;

      psiTwoBefore = psiBefore;
      psiBefore = psi;
      chiTwoBefore = chiBefore;
      chiBefore = chi;
    }
  }
}

/** Terms of the series: Wiscombe's count and eight more, which take the double-precision tail to nothing. */
export function termCount(x: number): number {
  // Below 0.02 the fifth term is under 1e-30 of the first, and χ_j of more terms would only overflow sooner.
  return x < 0.02 ? 5 : Math.ceil(x + 4.05 * Math.cbrt(x)) + 10;
}
