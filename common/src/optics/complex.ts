/** A complex number, for the few places where none of it stands in a hot loop. */
export interface Complex {
  readonly re: number;
  readonly im: number;
}

export const add = (a: Complex, b: Complex): Complex => ({ re: a.re + b.re, im: a.im + b.im });
export const subtract = (a: Complex, b: Complex): Complex => ({ re: a.re - b.re, im: a.im - b.im });
export const scale = (a: Complex, factor: number): Complex => ({ re: a.re * factor, im: a.im * factor });
export const multiply = (a: Complex, b: Complex): Complex => ({
  re: a.re * b.re - a.im * b.im,
  im: a.re * b.im + a.im * b.re,
});

export function divide(a: Complex, b: Complex): Complex {
  const below = b.re * b.re + b.im * b.im;
  return { re: (a.re * b.re + a.im * b.im) / below, im: (a.im * b.re - a.re * b.im) / below };
}

/** Principal root: real part 0 or more. */
export function squareRoot(a: Complex): Complex {
  const size = Math.hypot(a.re, a.im);
  if (size === 0) return { re: 0, im: 0 };
  // The larger part by addition, the smaller from it: no difference of near numbers.
  const larger = Math.sqrt((size + Math.abs(a.re)) / 2);
  const smaller = a.im / (2 * larger);
  if (a.re >= 0) return { re: larger, im: smaller };
  return { re: Math.abs(smaller), im: a.im < 0 ? -larger : larger };
}
