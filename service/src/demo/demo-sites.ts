/**
 * The invented scenario: expeditions, sites and numbers are made up, and marked so wherever they show.
 * Ratios lie in the span that field practice reports (2 to 5 in low latitudes, more near the poles).
 */
export interface DemoSite {
  site: string;
  latitudeDeg: number;
  longitudeDeg: number;
  /** flux of the reference window [g m⁻² yr⁻¹] */
  recentFlux: number;
  /** glacial maximum over reference */
  glacialRatio: number;
}

export interface DemoSheet {
  fileName: string;
  title: string;
  archive: 'marine' | 'loess' | 'ice';
  fluxUnit: string;
  /** how many of this unit make one g m⁻² yr⁻¹ */
  unitsPerCanonical: number;
  sites: DemoSite[];
}

const marine: DemoSite[] = [
  { site: 'QX-01', latitudeDeg: 33.62, longitudeDeg: -41.15, recentFlux: 1.1, glacialRatio: 2.4 },
  { site: 'QX-02', latitudeDeg: 44.18, longitudeDeg: -28.71, recentFlux: 0.62, glacialRatio: 2.9 },
  { site: 'QX-03', latitudeDeg: 27.44, longitudeDeg: -33.28, recentFlux: 2.3, glacialRatio: 2.1 },
  { site: 'QX-04', latitudeDeg: 3.26, longitudeDeg: -24.57, recentFlux: 2.8, glacialRatio: 2.0 },
  { site: 'QX-05', latitudeDeg: -2.81, longitudeDeg: -13.36, recentFlux: 1.4, glacialRatio: 2.3 },
  { site: 'QX-06', latitudeDeg: -31.27, longitudeDeg: -16.84, recentFlux: 0.21, glacialRatio: 3.1 },
  { site: 'QX-07', latitudeDeg: 38.74, longitudeDeg: 163.42, recentFlux: 0.84, glacialRatio: 2.2 },
  { site: 'QX-08', latitudeDeg: 46.31, longitudeDeg: 171.63, recentFlux: 0.55, glacialRatio: 2.6 },
  { site: 'QX-09', latitudeDeg: 35.12, longitudeDeg: -168.27, recentFlux: 0.37, glacialRatio: 2.4 },
  { site: 'QX-10', latitudeDeg: 1.87, longitudeDeg: -140.46, recentFlux: 0.052, glacialRatio: 2.5 },
  { site: 'QX-11', latitudeDeg: -3.44, longitudeDeg: 161.23, recentFlux: 0.11, glacialRatio: 2.2 },
  { site: 'QX-12', latitudeDeg: -56.32, longitudeDeg: -46.58, recentFlux: 0.16, glacialRatio: 5.2 },
  { site: 'QX-13', latitudeDeg: -58.74, longitudeDeg: -8.37, recentFlux: 0.09, glacialRatio: 6.4 },
  { site: 'QX-14', latitudeDeg: -60.16, longitudeDeg: -115.42, recentFlux: 0.034, glacialRatio: 3.3 },
  { site: 'QX-15', latitudeDeg: 15.43, longitudeDeg: 61.27, recentFlux: 6.4, glacialRatio: 1.9 },
  { site: 'QX-16', latitudeDeg: 11.86, longitudeDeg: 64.51, recentFlux: 4.1, glacialRatio: 2.2 },
];

const loess: DemoSite[] = [
  { site: 'Terrace L-1', latitudeDeg: 42.83, longitudeDeg: 98.46, recentFlux: 58, glacialRatio: 3.8 },
  { site: 'Terrace L-2', latitudeDeg: 39.57, longitudeDeg: 104.72, recentFlux: 74, glacialRatio: 3.2 },
  { site: 'Terrace L-3', latitudeDeg: 44.21, longitudeDeg: 110.35, recentFlux: 46, glacialRatio: 4.4 },
  { site: 'North rim', latitudeDeg: 48.36, longitudeDeg: 16.72, recentFlux: 31, glacialRatio: 6.8 },
  { site: 'South rim', latitudeDeg: 49.14, longitudeDeg: 28.41, recentFlux: 27, glacialRatio: 5.5 },
  { site: 'Bluff P-2', latitudeDeg: 41.28, longitudeDeg: -98.64, recentFlux: 62, glacialRatio: 8.2 },
  { site: 'Bluff P-5', latitudeDeg: 39.85, longitudeDeg: -95.33, recentFlux: 49, glacialRatio: 6.1 },
  { site: 'Pampa section', latitudeDeg: -43.17, longitudeDeg: -66.84, recentFlux: 22, glacialRatio: 4.9 },
];

const ice: DemoSite[] = [
  { site: 'Ice B-12', latitudeDeg: -77.36, longitudeDeg: 96.42, recentFlux: 0.00041, glacialRatio: 19 },
  { site: 'Ice B-14', latitudeDeg: -73.58, longitudeDeg: 42.73, recentFlux: 0.00057, glacialRatio: 15 },
  { site: 'Ice G-3', latitudeDeg: 72.64, longitudeDeg: -37.58, recentFlux: 0.0073, glacialRatio: 11 },
];

export const demoSheets: DemoSheet[] = [
  {
    fileName: 'invented_cruise_QX_cores.csv',
    title: 'Sea-floor cores of cruise QX (invented)',
    archive: 'marine',
    fluxUnit: 'g cm-2 kyr-1',
    unitsPerCanonical: 0.1,
    sites: marine,
  },
  {
    fileName: 'invented_loess_transect.csv',
    title: 'Loess transect L (invented)',
    archive: 'loess',
    fluxUnit: 'g m-2 yr-1',
    unitsPerCanonical: 1,
    sites: loess,
  },
  {
    fileName: 'invented_ice_cores_B_G.csv',
    title: 'Ice cores B and G (invented)',
    archive: 'ice',
    fluxUnit: 'mg m-2 yr-1',
    unitsPerCanonical: 1000,
    sites: ice,
  },
];

/** Waits in the queue, with warnings to look at. */
export const queuedSheet: DemoSheet = {
  fileName: 'invented_eastern_plain.csv',
  title: 'Loess sections of the eastern plain (invented)',
  archive: 'loess',
  fluxUnit: 'g m-2 yr-1',
  unitsPerCanonical: 1,
  sites: [
    { site: 'Plain E-1', latitudeDeg: 46.5, longitudeDeg: 36, recentFlux: 19, glacialRatio: 5.1 },
    { site: 'Plain E-2', latitudeDeg: 47.2, longitudeDeg: 38.4, recentFlux: 24, glacialRatio: 4.6 },
  ],
};

/** Was returned to its contributor with a query. */
export const returnedSheet: DemoSheet = {
  fileName: 'invented_southern_cores.csv',
  title: 'Southern cores of cruise QY (invented)',
  archive: 'marine',
  fluxUnit: 'g cm-2 kyr-1',
  unitsPerCanonical: 0.1,
  sites: [{ site: 'QY-01', latitudeDeg: -47.83, longitudeDeg: 148.62, recentFlux: 0.31, glacialRatio: 2.8 }],
};
