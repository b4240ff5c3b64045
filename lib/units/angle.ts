export function radiansFromDegrees(angleDeg: number): number {
  return (angleDeg * Math.PI) / 180;
}
