export type * from "./types";
export { layoutChart } from "./layout-chart";
export { shareTracks, type Stretch } from "./share-tracks";
export { tidyLanes } from "./tidy-lanes";
export { countCrossings, type TidyCard } from "./count-crossings";
export { leadChain, type Chain, type ChainCard } from "./lead-chain";
export { clockText, readClock, clockDegrees, CLOCK_STEPS } from "./clock";
export { lineStyle, fitDash, besideLine, hatchStrokes, type LineStyle, type StyledVerdict } from "./line-style";
