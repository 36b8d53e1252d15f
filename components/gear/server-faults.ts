import type { FieldFault } from "@/lib/client/fetch-json";

/** A refused field's name as the form knows it: without the envelope a replacement travels in, dots for brackets. */
export function formFieldOf(fault: Pick<FieldFault, "field">): string {
  return fault.field.replace(/\[(\d+)\]/g, ".$1").replace(/^gear\./, "");
}
