/** How results are rounded before the digest is taken, so that it stands on every machine. */
export const roundArea = (areaM2: number): number => round(areaM2, 100);
export const roundMeasure = (value: number): number => round(value, 10_000);
export const roundEnergy = (kwhPerM2: number): number => round(kwhPerM2, 1000);

/** −0 becomes 0. */
function round(value: number, perUnit: number): number {
  return Math.round(value * perUnit) / perUnit + 0;
}

/** A measure's value by its unit: areas to 0.01, energy to 0.001, hours and shares to 0.0001. */
export function roundByUnit(value: number, unit: string): number {
  if (unit === 'm²·h' || unit === 'm²') return roundArea(value);
  if (unit === 'kWh/m²') return roundEnergy(value);
  return roundMeasure(value);
}
