// How fast a mixed layer settles with the air: the transfer velocity by wind, and the time in which a disturbance of the
// dissolved carbon falls to 1/e. It knows no currents: water that leaves the layer first is what `shareReached` is for.
// Invariant: the time is long because most of the carbon that enters turns into hydrogen carbonate (carbonPerDioxide).
// Sources: Wanninkhof 2014 (Limnol. Oceanogr. Methods 12, 351): k = 0.251 U² (Sc/660)^-1/2, cm/h, and Schmidt numbers in sea
// water of salinity 35, -2 to 40 °C; Jones et al. 2014 (Global Biogeochem. Cycles 28, 1163) for times of months.

/** Standard uncertainty of the natural logarithm of the transfer velocity (Wanninkhof 2014: 20 %). */
export const transferVelocityUncertainty = 0.2;

/** Schmidt number of CO2 in sea water. */
export function carbonDioxideSchmidtNumber(celsius: number): number {
  return 2116.8 - 136.25 * celsius + 4.7353 * celsius ** 2 - 0.092307 * celsius ** 3 + 0.0007555 * celsius ** 4;
}

/** Transfer velocity of CO2 at a wind speed 10 m above the water, m/s. */
export function transferVelocityMPerS(windMPerS: number, celsius: number): number {
  const cmPerHour = 0.251 * windMPerS ** 2 * Math.sqrt(660 / carbonDioxideSchmidtNumber(celsius));
  return cmPerHour / 100 / 3600;
}

/** Time in which a well-mixed layer comes to 1/e of its disequilibrium, s. */
export function settlingTimeS(depthM: number, velocityMPerS: number, carbonPerDioxide: number): number {
  return (depthM / velocityMPerS) * carbonPerDioxide;
}

/** Share of the final uptake reached by water that stays in the layer for that time on average, leaving at random. */
export function shareReached(residenceS: number, settlingS: number): number {
  return residenceS / (residenceS + settlingS);
}
