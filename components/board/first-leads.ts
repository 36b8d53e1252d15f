import type { Gear } from "@/lib/schemas/gear";
import type { Jack } from "@/lib/schemas/jack";

/** The leads, as output and input ids, of a rig's first run: its newest pad into its newest conditioner, and that into its newest voice. */
export function firstLeads(gear: readonly Gear[]): [outputId: string, inputId: string][] {
  const newest = (kind: Gear["kind"]) => gear.filter((item) => item.kind === kind && !item.retired).at(-1);
  const [pad, conditioner, voice] = [newest("pad"), newest("conditioner"), newest("voice")];
  return [
    pairOf(pad?.jacks.find((jack) => jack.direction === "output"), conditioner?.jacks.find((jack) => jack.role === "pad-in")),
    feed(conditioner?.jacks ?? [], voice?.jacks ?? []),
  ].filter((pair) => pair !== null);
}

/** The first output whose kind of signal an input listens to; where none fits, the first of each, and the verdict says why not. */
function feed(from: readonly Jack[], to: readonly Jack[]): [string, string] | null {
  const outputs = from.filter((jack) => jack.direction === "output");
  const inputs = to.filter((jack) => jack.direction === "input");
  for (const output of outputs) {
    const { signal } = output.output;
    const input = signal === null ? undefined : inputs.find((jack) => jack.input.accepts.includes(signal));
    if (input) return [output.id, input.id];
  }
  return pairOf(outputs[0], inputs[0]);
}

function pairOf(output: Jack | undefined, input: Jack | undefined): [string, string] | null {
  return output && input ? [output.id, input.id] : null;
}
