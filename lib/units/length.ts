/** Micrometres in a millimetre, exact (SI prefixes). */
const UM_PER_MM = 1000;

export function mmFromUm(lengthUm: number): number {
  return lengthUm / UM_PER_MM;
}

export function umFromMm(lengthMm: number): number {
  return lengthMm * UM_PER_MM;
}
