import type { Connection, ListenerCheck } from "../connection-types";
import { DIODE_DROP_V } from "../fixes/find-series-diode";
import { branchLoad, checkInLead, type LeadParts } from "../fixes/try-lead";
import type { InlineParts } from "../patch-types";
import type { PatchNode } from "./index-patch";

/** Of the resistor that a series diode at an open input needs. */
const PULL_DOWN_TOL = 0.05;

/** Parts in the leads of a node, by the place of the input they stand in front of. */
export function inlineOf(node: PatchNode): Map<number, LeadParts> {
  const parts = new Map<number, LeadParts>();
  node.inputs.forEach(({ jack }, place) => {
    const into = node.leads.filter((lead) => lead.inputId === jack.id);
    const inline = into.length === 1 ? into[0]?.inline : undefined;
    if (inline) parts.set(place, partsOf(inline));
  });
  return parts;
}

function partsOf(inline: InlineParts): LeadParts {
  if (inline.kind === "series-diode") {
    return { seriesOhm: 0, shuntOhm: inline.pullDownOhm === null ? null : { nominal: inline.pullDownOhm, tol: PULL_DOWN_TOL }, diodeDropV: DIODE_DROP_V };
  }
  const resistor = (nominal: number) => ({ nominal, tol: inline.tol });
  const series = { seriesOhm: resistor(inline.seriesOhm), shuntOhm: inline.kind === "series-resistor" ? null : resistor(inline.shuntOhm) };
  return inline.kind === "diode-divider" ? { ...series, diodeDropV: DIODE_DROP_V } : series;
}

/** The node as inputs without parts of their own see it: each lead with parts is one more load. */
export function withInlineLoads(connection: Connection, inline: ReadonlyMap<number, LeadParts>): Connection {
  if (inline.size === 0) return connection;
  return {
    ...connection,
    inputs: connection.inputs.map((input, place) => {
      const parts = inline.get(place);
      return parts ? { ...branchLoad(input, parts), id: input.id } : input;
    }),
  };
}

/** What an input behind parts gets. Null where the parts cannot be followed: several outputs drive the node, or a diode stands in a mult. */
export function checkBehind(connection: Connection, place: number, inline: ReadonlyMap<number, LeadParts>): ListenerCheck | null {
  const parts = inline.get(place);
  const input = connection.inputs[place];
  if (!parts || !input || connection.outputs.filter((output) => output.signal !== "sensor").length !== 1) return null;
  const seen = withInlineLoads(connection, new Map([...inline].filter(([other]) => other !== place)));
  return checkInLead(seen, place, parts)?.check ?? null;
}
