import studentQuantile from "@stdlib/stats-base-dists-t-quantile";

/** Student's t that leaves `probability` between -t and +t (GUM, Table G.2 levels). */
export function studentTwoSided(probability: number, degreesOfFreedom: number): number {
  return studentQuantile((1 + probability) / 2, degreesOfFreedom);
}
