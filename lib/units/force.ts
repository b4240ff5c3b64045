/** Standard acceleration of gravity, m/s2, exact: 3rd CGPM (1901). 1 kgf is this many newtons. */
export const NEWTONS_PER_KGF = 9.80665;

export function newtonsFromKgf(forceKgf: number): number {
  return forceKgf * NEWTONS_PER_KGF;
}

export function newtonsFromGf(forceGf: number): number {
  return (forceGf * NEWTONS_PER_KGF) / 1000;
}

export function kgfFromNewtons(forceN: number): number {
  return forceN / NEWTONS_PER_KGF;
}
