export { toRange, nominalOf, type Limits, type Range, type Spread, type Toleranced } from "./spread";
export { UNITS, type Unit } from "./units";
export { parseQuantity, type Parsed } from "./parse-quantity";
export { parseSpread } from "./parse-spread";
export { exactQuantityText, exactSpreadText, formatQuantity, formatRange, formatSpread } from "./format-quantity";
export { E_SERIES, nearestPreferred, preferredAbove, preferredBelow, preferredBetween, type SeriesName } from "./e-series";
