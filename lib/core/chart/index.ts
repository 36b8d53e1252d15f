export type * from "./types";
export { layoutChart } from "./layout-chart";
export { tidyLanes, countCrossings, type TidyCard } from "./tidy-lanes";
export { leadChain, type Chain, type ChainCard } from "./lead-chain";
export { clockText, clockDegrees, CLOCK_STEPS } from "./clock";
export { lineStyle, hatchStrokes, type LineStyle, type StyledVerdict } from "./line-style";
