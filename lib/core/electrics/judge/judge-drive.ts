import { formatQuantity } from "@/lib/core/units/format-quantity";
import { toRange } from "@/lib/core/units/spread";
import type { Reason, Signal } from "../jacks";
import { isAbove } from "./compare";
import { capital, nameOutput, type Scene } from "./scene";

const A_SIGNAL: Record<Signal, string> = {
  sensor: "a bare sensor", trigger: "a trigger", gate: "a gate", envelope: "an envelope", control: "a control voltage", audio: "audio",
};

/** `clash`, `overload`, `reversed`, `wrong-kind`: do the outputs suit each other and the input, before any level is asked for? */
export function judgeDrive(scene: Scene): Reason[] {
  return [...judgeClash(scene), ...judgeOverload(scene), ...judgePolarity(scene), ...judgeKind(scene)];
}

function judgeClash({ outputs, driving }: Scene): Reason[] {
  if (driving.length < 2 || driving.every((i) => outputs[i]?.or)) return [];
  return [{ verdict: "clash", text: `${driving.length} outputs drive the same input and nothing keeps them apart: join them through diodes, or pull all but one.`, measured: driving.length }];
}

function judgeOverload(scene: Scene): Reason[] {
  return scene.driving.flatMap((index): Reason[] => {
    const limit = scene.outputs[index]?.limitA;
    const current = scene.currentsA.get(index);
    if (limit === undefined || !current) return [];
    const asked = Math.max(Math.abs(current.min), Math.abs(current.max));
    const given = toRange(limit).min;
    if (!isAbove(asked, given)) return [];
    const text = `${capital(nameOutput(scene, index))} would have to carry ${formatQuantity(asked, "A")}; it is sure of ${formatQuantity(given, "A")}.`;
    return [{ verdict: "overload", text, measured: asked, limit: given, unit: "A" }];
  });
}

function judgePolarity(scene: Scene): Reason[] {
  const wanted = scene.input.polarity ?? "rising";
  return scene.outputs.flatMap((output, index): Reason[] => {
    const given = output.polarity ?? "rising";
    if (given === wanted) return [];
    return [{ verdict: "reversed", text: `${capital(nameOutput(scene, index))} goes ${way(given)} when struck; the input waits for an edge going ${way(wanted)}.` }];
  });
}

function judgeKind(scene: Scene): Reason[] {
  const { accepts } = scene.input;
  return scene.outputs.flatMap((output, index): Reason[] => {
    if (output.signal === undefined || accepts.includes(output.signal)) return [];
    const wanted = accepts.length === 0 ? "nothing that is known" : accepts.map((s) => A_SIGNAL[s]).join(" or ");
    return [{ verdict: "wrong-kind", text: `${capital(nameOutput(scene, index))} gives ${A_SIGNAL[output.signal]}; the input takes ${wanted}.` }];
  });
}

function way(polarity: "rising" | "falling"): string {
  return polarity === "rising" ? "up" : "down";
}
