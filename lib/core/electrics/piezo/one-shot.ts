/** Length of a 555's single pulse, s: R·C·ln 3. Source: TI SLFS022, thresholds at 1/3 and 2/3 of the supply; the sheet's 1.1·R·C is the same, rounded. */
export function oneShotS(ohm: number, farad: number): number {
  if (!(ohm > 0 && farad > 0) || !Number.isFinite(ohm * farad)) throw new RangeError(`needs a resistor and a capacitor above 0: ${ohm} Ω, ${farad} F`);
  return ohm * farad * Math.log(3);
}
