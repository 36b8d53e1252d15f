import type { GearInput } from "@/lib/schemas/gear";
import type { InputJack, OutputJack } from "@/lib/schemas/jack";
import { SIGNAL_SHORT } from "./gear-words";
import { showFigure } from "./figure-text";

/** The figures a person would ask for first, in one line. */
export function summariseGear(gear: Pick<GearInput, "details" | "jacks">): string {
  const { details, jacks } = gear;
  switch (details.kind) {
    case "pad":
      return details.sensor === "piezo"
        ? join([known("peak", details.peakV, "V"), known("", details.farad, "F")])
        : join([known("rest", details.restOhm, "Ohm"), known("hit", details.hitOhm, "Ohm")]);
    case "conditioner": {
      const { circuit } = details;
      if (!circuit) return describeJacks(jacks);
      const { coupling, threshold } = circuit;
      return join([
        `RC ${showFigure(coupling.farad * coupling.ohm, "s")}`,
        `threshold pot ${showFigure(threshold.potOhm, "Ohm")}`,
        circuit.envelope ? "with envelope" : "",
      ]);
    }
    case "desk-channel":
      return join([`channel ${details.channel}`, describeJacks(jacks)]);
    case "supply":
      return details.lowV < 0 ? `${showFigure(details.highV, "V")} and ${showFigure(details.lowV, "V")}` : showFigure(details.highV, "V");
    default:
      return describeJacks(jacks);
  }
}

function describeJacks(jacks: GearInput["jacks"]): string {
  return jacks.map((jack) => (jack.direction === "input" ? describeInput(jack) : describeOutput(jack))).filter(Boolean).join(" → ");
}

function describeInput({ input }: InputJack): string {
  if (input.accepts.every((signal) => signal === "sensor")) return "";
  const figure = input.maxDbu !== null ? `up to ${showFigure(input.maxDbu, "dBu")}` : input.onV !== null ? `fires at ${showFigure(input.onV, "V")}` : "";
  return join([`${input.accepts.map((signal) => SIGNAL_SHORT[signal]).join("/")} in`, figure, input.phantom ? "phantom on" : ""], " ");
}

function describeOutput({ output }: OutputJack): string {
  if (output.signal === "sensor") return "";
  return join([`${SIGNAL_SHORT[output.signal]} out`, output.activeV === null ? "" : showFigure(output.activeV, "V")], " ");
}

const known = (word: string, value: Parameters<typeof showFigure>[0], unit: Parameters<typeof showFigure>[1]): string =>
  value === null || value === undefined ? "" : join([word, showFigure(value, unit)], " ");

const join = (parts: string[], between = ", "): string => parts.filter(Boolean).join(between);
