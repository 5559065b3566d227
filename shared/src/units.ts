/** Conversions between the units people read and the units kept. None of them rounds. */
const cmPerInch = 2.54;
const inchesPerFoot = 12;
const mPerFoot = 0.3048;
const kgPerPound = 0.45359237;

export const inchesToCm = (inches: number): number => inches * cmPerInch;
export const cmToInches = (cm: number): number => cm / cmPerInch;

/** Feet and inches become inches first (rule 0.6). */
export const feetInchesToCm = (feet: number, inches: number): number => inchesToCm(feet * inchesPerFoot + inches);

/** Whole feet and the remaining inches, to one decimal; 182.8 cm is 5 ft 12.0 in rounded up to 6 ft 0 in. */
export function cmToFeetInches(cm: number): { feet: number; inches: number } {
  const tenths = Math.round(cmToInches(cm) * 10);
  const tenthsPerFoot = inchesPerFoot * 10;
  return { feet: Math.floor(tenths / tenthsPerFoot), inches: (tenths % tenthsPerFoot) / 10 };
}

export const poundsToKg = (pounds: number): number => pounds * kgPerPound;
export const kgToPounds = (kg: number): number => kg / kgPerPound;

/** Whole milliliters; volumes are kept as these. */
export const litersToMl = (liters: number): number => Math.round(liters * 1000);
export const mlToLiters = (ml: number): number => ml / 1000;

export const metersToFeet = (meters: number): number => meters / mPerFoot;
export const feetToMeters = (feet: number): number => feet * mPerFoot;
