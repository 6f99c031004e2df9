import type { VettingContext } from '../context';
import { placeOf } from '../place';
import type { Rule, RuleHit } from '../rule';
import { siteKey, sitesOf, type Site } from '../samples';
import { limitsOf } from '../limits';

const LIMITS = { sameNameApartDeg: 0.1, otherNameWithinDeg: 0.01 };

/** One name at two places, or two names at one place; within the file, and against what Holdings know. */
export const siteNames: Rule = {
  id: 'V15',
  slug: 'site-names',
  title: 'Site name and position disagree',
  severity: 'warning',
  stage: 'submission',
  needs: ['site', 'latitudeDeg', 'longitudeDeg'],
  source: 'common practice, no source',
  why: 'The same core under two names is counted twice; two cores under one name are averaged into one.',
  limits: LIMITS,

  *check(context) {
    const limits = limitsOf(context, 'V15', LIMITS);
    const held = context.heldSites.map((site) => ({
      ...site,
      name: site.site,
      key: siteKey(site.site),
      from: () => `dataset "${site.datasetTitle}"`,
    }));
    const known = new Neighbourhood(limits.otherNameWithinDeg);
    const names = new Map<string, Known>();
    for (const site of held) {
      known.add(site);
      if (!names.has(site.key)) names.set(site.key, site);
    }
    for (const site of sitesOf(context)) {
      const { name, latitudeDeg, longitudeDeg, rows } = site;
      const from = () => `row ${rows[0]!.row} of sheet "${rows[0]!.sheet}"`;
      const entry: Known = { name, key: siteKey(name), latitudeDeg, longitudeDeg, from };
      yield* compare(context, site, names.get(entry.key), known.sameAs(entry), limits.sameNameApartDeg);
      known.add(entry);
      if (!names.has(entry.key)) names.set(entry.key, entry);
    }
  },
};

interface Known {
  name: string;
  /** name as compared */
  key: string;
  latitudeDeg: number;
  longitudeDeg: number;
  from: () => string;
}

function* compare(
  context: VettingContext,
  site: Site,
  namesake: Known | undefined,
  neighbour: Known | undefined,
  apartDeg: number,
): Iterable<RuleHit> {
  const place = placeOf(context, site.rows[0]!, 'site');
  const where = `${site.latitudeDeg}°, ${site.longitudeDeg}°`;
  if (namesake && separationDeg(site, namesake) > apartDeg) {
    yield {
      ...place,
      subject: 'same-name',
      message: `"${site.name}" stands at ${where}, but ${namesake.from()} has that name at ${namesake.latitudeDeg}°, ${namesake.longitudeDeg}°.`,
      remedy: 'Type the right position, give the other core its own name, or waive it with a reason.',
      remedyKind: 'waive',
    };
  }
  if (neighbour) {
    yield {
      ...place,
      subject: 'same-place',
      message: `"${site.name}" at ${where} stands where ${neighbour.from()} has "${neighbour.name}".`,
      remedy: 'Use one name if it is one core, or waive it if they are two.',
      remedyKind: 'waive',
    };
  }
}

const separationDeg = (a: Known | Site, b: Known | Site): number => {
  const east = Math.abs(((((a.longitudeDeg - b.longitudeDeg) % 360) + 540) % 360) - 180);
  return Math.max(Math.abs(a.latitudeDeg - b.latitudeDeg), east);
};

/** Positions in cells as wide as the search, so that a look-up reads nine cells and never the whole list. */
class Neighbourhood {
  private readonly cells = new Map<string, Known[]>();

  constructor(private readonly widthDeg: number) {}

  add(site: Known): void {
    const key = this.key(site, 0, 0);
    const cell = this.cells.get(key);
    if (!cell) this.cells.set(key, [site]);
    else if (cell.length < 8) cell.push(site); // more names than this at one place add nothing
  }

  /** A site of another name within the width. */
  sameAs(site: Known): Known | undefined {
    for (const [dy, dx] of AROUND) {
      for (const other of this.cells.get(this.key(site, dy, dx)) ?? []) {
        const near = separationDeg(site, other) < this.widthDeg;
        if (near && other.key !== site.key) return other;
      }
    }
    return undefined;
  }

  private key(site: Known, dy: number, dx: number): string {
    const around = Math.round(360 / this.widthDeg);
    const column = Math.floor((((site.longitudeDeg % 360) + 360) % 360) / this.widthDeg) + dx;
    return `${Math.floor(site.latitudeDeg / this.widthDeg) + dy},${(column + around) % around}`;
  }
}

const AROUND = [-1, 0, 1].flatMap((dy) => [-1, 0, 1].map((dx) => [dy, dx] as const));
