/** A linear or logarithmic axis from data to pixels. */
export type Scale = { (value: number): number; domain: [number, number] };

export function linearScale(domain: [number, number], range: [number, number]): Scale {
  const [d0, d1] = domain;
  const [r0, r1] = range;
  const span = d1 - d0 || 1;
  return Object.assign((value: number) => r0 + ((value - d0) / span) * (r1 - r0), { domain });
}

/** Values at or below the lower end are drawn on the lower end: a logarithm has no place for them. */
export function logScale(domain: [number, number], range: [number, number]): Scale {
  const place = linearScale([Math.log10(domain[0]), Math.log10(domain[1])], range);
  return Object.assign((value: number) => place(Math.log10(Math.max(value, domain[0]))), { domain });
}

const steps = [1, 2, 2.5, 5, 10];

/** Round values inside a domain, about `count` of them. */
export function niceTicks([low, high]: [number, number], count = 5): number[] {
  const span = high - low;
  if (!(span > 0)) return [low];
  const rough = span / count;
  const power = 10 ** Math.floor(Math.log10(rough));
  const step = steps.find((one) => one * power >= rough)! * power;
  const first = Math.ceil(low / step - 1e-9);
  const last = Math.floor(high / step + 1e-9);
  return Array.from({ length: last - first + 1 }, (_, at) => Number(((first + at) * step).toPrecision(12)));
}

/** Powers of ten inside a domain, with 2 and 5 between them where there is room. */
export function logTicks([low, high]: [number, number]): number[] {
  const from = Math.floor(Math.log10(low));
  const to = Math.ceil(Math.log10(high));
  const between = to - from <= 2 ? [1, 2, 5] : [1];
  const ticks: number[] = [];
  for (let power = from; power <= to; power += 1) {
    for (const part of between) ticks.push(Number((part * 10 ** power).toPrecision(12)));
  }
  return ticks.filter((tick) => tick >= low * 0.999 && tick <= high * 1.001);
}

/** A domain that holds all values with a little air, zero included when asked. */
export function domainOf(values: readonly number[], withZero = false): [number, number] {
  const all = withZero ? [...values, 0] : values;
  const low = Math.min(...all);
  const high = Math.max(...all);
  const air = (high - low || Math.abs(high) || 1) * 0.06;
  return [low === 0 ? 0 : low - air, high === 0 ? 0 : high + air];
}

/** Decimals that tell neighbouring ticks apart. */
export const tickDecimals = (ticks: readonly number[]) =>
  Math.max(0, ...ticks.map((tick) => String(tick).split('.')[1]?.length ?? 0));
