// Power from speed and speed from power by the propeller law, from one known service point. Knows no hull.
// Invariant: at the service speed, in service, the power is that of the service point; the two functions are inverse.
// Source: the law of a propeller at constant advance coefficient, power as the cube of speed; other exponents are given by
// who knows the hull. The service power holds the sea margin, as in a contract ("13 kn at 85 % with 15 % sea margin").

export interface ServicePoint {
  readonly speedMPerS: number;
  /** Power there over the rating, sea margin included. */
  readonly load: number;
  /** Added to the power in calm water. */
  readonly seaMargin: number;
  /** Added on top of the service power for a hull and propeller fouler than the sea margin reckons with. */
  readonly fouling: number;
  readonly exponent: number;
}

/** Load over the rating at a speed; `calm` leaves the sea margin out. */
export function loadAtSpeed(point: ServicePoint, speedMPerS: number, calm: boolean): number {
  return loadAtServiceSpeed(point, calm) * (speedMPerS / point.speedMPerS) ** point.exponent;
}

/** Speed in m/s at a load over the rating. */
export function speedAtLoad(point: ServicePoint, load: number, calm: boolean): number {
  return point.speedMPerS * (load / loadAtServiceSpeed(point, calm)) ** (1 / point.exponent);
}

function loadAtServiceSpeed({ load, seaMargin, fouling }: ServicePoint, calm: boolean): number {
  return (load * (1 + fouling)) / (calm ? 1 + seaMargin : 1);
}
