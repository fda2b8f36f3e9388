const LOWEST_TRIP_MILLIAMPS = 6;
const HIGHEST_CURVE_MILLIAMPS = 264;
const SHORTEST_LIMIT_SECONDS = 0.025;

/**
 * Longest time in which a Class A GFCI must open, in seconds, at a leakage of `milliamps` (mA rms).
 * `null` below 6 mA, where nothing obliges it to open; 0.025 s above 264 mA.
 * Source: UL 943, Class A trip-time curve, T = (20 / I)^1.43.
 */
export function maxTripSeconds(milliamps: number): number | null {
  if (!(milliamps >= LOWEST_TRIP_MILLIAMPS)) return null;
  if (milliamps > HIGHEST_CURVE_MILLIAMPS) return SHORTEST_LIMIT_SECONDS;
  return (20 / milliamps) ** 1.43;
}
