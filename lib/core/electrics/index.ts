export * from "./jacks";
export type * from "./connection-types";
export { checkConnection } from "./check-connection";
export { findConnectionIssues, findInputIssues, findOutputIssues, type Issue } from "./find-connection-issues";
export { dbuOfPeak, peakOfDbu } from "./judge/judge-audio";
export { severityOf, worstVerdict } from "./judge/order-verdicts";
export type * from "./patch-types";
export { checkPatch, recheckPatch, type CheckPatchOptions } from "./check-patch";
export { startingFigureSources, startingGear, startingSourcesOf, startingVariants, type StartingGear, type StartingKind, type StartingVariant } from "./starting-figures";
