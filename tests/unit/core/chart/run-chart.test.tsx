import type { ComponentProps } from "react";
import { renderToStaticMarkup } from "react-dom/server";
import { describe, expect, it } from "vitest";
import { RunChart } from "@/components/chart/run-chart";
import { layoutChart, type ChartCard } from "@/lib/core/chart";
import { boardMetrics } from "../../../factories/random-board";

const cards: ChartCard[] = [
  { id: "trigger", lane: 1, folded: false, jacks: [{ id: "out", side: "out" }] },
  { id: "drum", lane: 2, folded: false, jacks: [{ id: "in", side: "in" }] },
];
const layout = layoutChart({ cards, leads: [{ id: "lead", from: "out", to: "in" }], metrics: boardMetrics });
const names: ComponentProps<typeof RunChart>["cards"] = [{ id: "trigger", name: "Kick trigger", jackNames: { out: "Trig out" } }, { id: "drum", name: "Low drum", jackNames: { in: "Trig in" } }];
const leads = [{ id: "lead", number: 3, verdict: "hot" as const, level: "8.1 V", label: "Kick trigger Trig out to Low drum Trig in" }];
const draw = (onPick?: (leadId: string) => void) => renderToStaticMarkup(<RunChart layout={layout} tapeHeight={boardMetrics.tapeHeight} cards={names} leads={leads} label="Run chart" onPick={onPick} />);

describe("a run chart", () => {
  it("shows lanes, names, jacks, and number, level and verdict at the input", () => {
    const text = draw().replace(/<[^>]*>/g, "|");
    for (const part of ["Conditioning", "Kick trigger", "Trig out", "Low drum", "Trig in", "3 8.1 V ", "hot"]) expect(text).toContain(part);
  });
  it("is one picture with a name, unless its tags can be picked", () => {
    expect(draw()).toMatch(/^<svg [^>]*role="img" aria-label="Run chart"/);
    expect(draw()).not.toContain('role="button"');
    const picked = draw(() => undefined);
    expect(picked).toMatch(/^<svg [^>]*role="group"/);
    expect(picked.match(/role="button" tabindex="0" aria-label="Lead 3, Kick trigger Trig out to Low drum Trig in, 8.1 V, hot"/g)).toHaveLength(1);
  });
});
