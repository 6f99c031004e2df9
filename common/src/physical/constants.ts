/** Radians in one degree. */
export const RADIANS = Math.PI / 180;

/** Authalic radius of the Earth [m]: a sphere of the same surface (WGS 84, rounded). */
export const EARTH_RADIUS_M = 6371007.181;

/** Stefan–Boltzmann constant [W m⁻² K⁻⁴], exact since the SI of 2019, rounded. */
export const STEFAN_BOLTZMANN = 5.670374419e-8;

/** Days in a Julian year, the year used for every flux. */
export const DAYS_PER_YEAR = 365.25;

/** Total solar irradiance at one astronomical unit [W m⁻²]: IAU 2015 Resolution B3, from memory. */
export const SOLAR_CONSTANT_WM2 = 1361;
