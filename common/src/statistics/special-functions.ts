const LANCZOS = [
  0.9999999999998099, 676.5203681218851, -1259.1392167224028, 771.3234287776531, -176.6150291621406,
  12.507343278686905, -0.13857109526572012, 0.000009984369578019572, 1.5056327351493116e-7,
];

/** ln Γ(x) for x > 0, Lanczos (1964) with g = 7 and nine terms (coefficients from memory): relative error about 1e-15. */
export function logGamma(x: number): number {
  if (x < 0.5) return Math.log(Math.PI / Math.sin(Math.PI * x)) - logGamma(1 - x);
  const z = x - 1;
  const t = z + 7.5;
  const series = LANCZOS.reduce((sum, term, i) => (i === 0 ? term : sum + term / (z + i)), 0);
  return 0.5 * Math.log(2 * Math.PI) + (z + 0.5) * Math.log(t) - t + Math.log(series);
}

/** Complementary error function. Series of positive terms below 2.5, continued fraction above; about 1e-15. */
export function erfc(x: number): number {
  if (x < 0) return 2 - erfc(-x);
  return x < 2.5 ? 1 - erfSeries(x) : erfcFraction(x);
}

function erfSeries(x: number): number {
  let term = x;
  let sum = x;
  for (let n = 1; term > 1e-17 * sum; n++) {
    term *= (2 * x * x) / (2 * n + 1);
    sum += term;
  }
  return (2 / Math.sqrt(Math.PI)) * Math.exp(-x * x) * sum;
}

/** erfc x = e^(−x²)/√π · 1/(x + ½/(x + 1/(x + 3⁄2/(x + …)))), taken from the far end. */
function erfcFraction(x: number): number {
  let tail = x;
  for (let n = 80; n >= 1; n--) tail = x + n / 2 / tail;
  return Math.exp(-x * x) / (Math.sqrt(Math.PI) * tail);
}

/** Standard normal distribution function Φ(z). */
export function normalCdf(z: number): number {
  return 0.5 * erfc(-z / Math.SQRT2);
}

/** Regularised incomplete beta function I_x(a, b), modified Lentz continued fraction. a, b > 0, 0 ≤ x ≤ 1. */
export function incompleteBeta(x: number, a: number, b: number): number {
  if (x <= 0) return 0;
  if (x >= 1) return 1;
  if (x > (a + 1) / (a + b + 2)) return 1 - incompleteBeta(1 - x, b, a);
  const logFront = logGamma(a + b) - logGamma(a) - logGamma(b) + a * Math.log(x) + b * Math.log1p(-x);
  return (Math.exp(logFront) / a) * betaFraction(x, a, b);
}

function betaFraction(x: number, a: number, b: number): number {
  const tiny = 1e-300;
  const away = (v: number) => (Math.abs(v) < tiny ? tiny : v);
  let c = 1;
  let d = 1 / away(1 - ((a + b) * x) / (a + 1));
  let h = d;
  for (let m = 1; m <= 1000; m++) {
    const even = (m * (b - m) * x) / ((a + 2 * m - 1) * (a + 2 * m));
    d = 1 / away(1 + even * d);
    c = away(1 + even / c);
    h *= d * c;
    const odd = (-(a + m) * (a + b + m) * x) / ((a + 2 * m) * (a + 2 * m + 1));
    d = 1 / away(1 + odd * d);
    c = away(1 + odd / c);
    h *= d * c;
    if (Math.abs(d * c - 1) < 1e-16) break;
  }
  return h;
}

/** x with I_x(a, b) = p: Newton steps kept inside a shrinking bracket, so it cannot run away. */
export function inverseIncompleteBeta(p: number, a: number, b: number): number {
  if (p <= 0) return 0;
  if (p >= 1) return 1;
  const logBeta = logGamma(a) + logGamma(b) - logGamma(a + b);
  let low = 0;
  let high = 1;
  let x = a / (a + b);
  for (let step = 0; step < 200; step++) {
    const miss = incompleteBeta(x, a, b) - p;
    if (miss > 0) high = x;
    else low = x;
    const density = Math.exp((a - 1) * Math.log(x) + (b - 1) * Math.log1p(-x) - logBeta);
    const wanted = x - miss / density;
    const next = wanted > low && wanted < high ? wanted : (low + high) / 2;
    if (Math.abs(next - x) <= 2e-16 * x || high - low <= 1e-16 * x) return next;
    x = next;
  }
  return x;
}

/** Quantile of Student's t, degrees of freedom > 0 and not necessarily whole; 0 < p < 1. */
export function studentQuantile(p: number, degreesOfFreedom: number): number {
  if (p === 0.5) return 0;
  const tail = Math.min(p, 1 - p);
  const x = inverseIncompleteBeta(2 * tail, degreesOfFreedom / 2, 0.5);
  const t = Math.sqrt((degreesOfFreedom * (1 - x)) / x);
  return p < 0.5 ? -t : t;
}
