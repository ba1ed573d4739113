/**
 * Exact unit factors and converters. SI inside the calculation; these are used only where numbers come in or go out,
 * and where a published check value is in other units.
 */

/** Standard gravity, m/s² (3rd CGPM 1901, exact by definition). */
export const STANDARD_GRAVITY_MS2 = 9.80665;
/** International foot, m (1959 agreement, exact). */
export const METRES_PER_FOOT = 0.3048;
/** International inch, m (exact). */
export const METRES_PER_INCH = 0.0254;
/** Avoirdupois pound, kg (1959 agreement, exact). */
export const KILOGRAMS_PER_POUND = 0.45359237;
/** Pound-force, N (exact: pound × standard gravity). */
export const NEWTONS_PER_POUND_FORCE = KILOGRAMS_PER_POUND * STANDARD_GRAVITY_MS2;
/** Kilogram-force, N (exact). */
export const NEWTONS_PER_KILOGRAM_FORCE = STANDARD_GRAVITY_MS2;
/** Pound-force per square foot, Pa (exact). */
export const PASCALS_PER_PSF = NEWTONS_PER_POUND_FORCE / METRES_PER_FOOT ** 2;
/** International mile, m (exact). */
export const METRES_PER_MILE = 1609.344;
/** International nautical mile, m (exact). */
export const METRES_PER_NAUTICAL_MILE = 1852;
const SECONDS_PER_HOUR = 3600;
/** Radians in one degree. */
export const RADIANS_PER_DEGREE = Math.PI / 180;

/** Newtons from pounds-force. */
export const newtonsFromPoundsForce = (poundsForce: number): number => poundsForce * NEWTONS_PER_POUND_FORCE;
/** Pounds-force from newtons. */
export const poundsForceFromNewtons = (forceN: number): number => forceN / NEWTONS_PER_POUND_FORCE;
/** Newtons from kilograms-force. */
export const newtonsFromKilogramsForce = (kilogramsForce: number): number =>
  kilogramsForce * NEWTONS_PER_KILOGRAM_FORCE;
/** Kilograms-force from newtons. */
export const kilogramsForceFromNewtons = (forceN: number): number => forceN / NEWTONS_PER_KILOGRAM_FORCE;
/** Metres from feet. */
export const metresFromFeet = (feet: number): number => feet * METRES_PER_FOOT;
/** Feet from metres. */
export const feetFromMetres = (lengthM: number): number => lengthM / METRES_PER_FOOT;
/** Metres from inches. */
export const metresFromInches = (inches: number): number => inches * METRES_PER_INCH;
/** Inches from metres. */
export const inchesFromMetres = (lengthM: number): number => lengthM / METRES_PER_INCH;
/** Metres per second from kilometres per hour. */
export const msFromKmh = (speedKmh: number): number => (speedKmh * 1000) / SECONDS_PER_HOUR;
/** Kilometres per hour from metres per second. */
export const kmhFromMs = (speedMs: number): number => (speedMs * SECONDS_PER_HOUR) / 1000;
/** Metres per second from miles per hour. */
export const msFromMph = (speedMph: number): number => (speedMph * METRES_PER_MILE) / SECONDS_PER_HOUR;
/** Miles per hour from metres per second. */
export const mphFromMs = (speedMs: number): number => (speedMs * SECONDS_PER_HOUR) / METRES_PER_MILE;
/** Metres per second from knots. */
export const msFromKnots = (speedKnots: number): number => (speedKnots * METRES_PER_NAUTICAL_MILE) / SECONDS_PER_HOUR;
/** Knots from metres per second. */
export const knotsFromMs = (speedMs: number): number => (speedMs * SECONDS_PER_HOUR) / METRES_PER_NAUTICAL_MILE;
/** Pascals from pounds-force per square foot. */
export const pascalsFromPsf = (pressurePsf: number): number => pressurePsf * PASCALS_PER_PSF;
/** Pounds-force per square foot from pascals. */
export const psfFromPascals = (pressurePa: number): number => pressurePa / PASCALS_PER_PSF;
/** Radians from degrees. */
export const radiansFromDegrees = (angleDeg: number): number => angleDeg * RADIANS_PER_DEGREE;
/** Degrees from radians. */
export const degreesFromRadians = (angleRad: number): number => angleRad / RADIANS_PER_DEGREE;
