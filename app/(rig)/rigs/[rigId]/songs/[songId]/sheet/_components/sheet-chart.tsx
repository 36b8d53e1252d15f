import clsx from "clsx";
import { ChartTracks } from "@/components/chart/chart-tracks";
import type { Verdict } from "@/lib/core/electrics/jacks";
import { chartPages, tagText, TAG_SIZE, type PaperChart } from "@/lib/paper/chart-pages";
import { scaleLayout } from "@/lib/paper/scale-layout";
import type { ChartView } from "@/lib/paper/sheet-view";

/** CSS pixels a point. */
const PX = 96 / 72;
/** The chart of the PDF at its own size; only its height is free here. */
const LOOK = { jackPitch: 21, cardGap: 5, nameSize: 15 };
/** What is left of A4 beside the printer's and the page's own margins. */
const WIDTH_PT = 496;
const LANE_NAMES = ["Pads", "Conditioning", "Voices", "Desk"] as const;

export function SheetChart({ chart }: { chart: ChartView }) {
  return (
    <div role="region" aria-label="Run chart; the table of leads below says the same in words" tabIndex={0} className="overflow-x-auto print:overflow-visible">
      {chartPages(chart, LOOK, { width: WIDTH_PT, height: 1e6, firstHeight: 1e6 }).map((part, index) => <ChartPart key={index} part={part} />)}
    </div>
  );
}

function ChartPart({ part }: { part: PaperChart }) {
  const { view, names } = part;
  const layout = scaleLayout(part.layout, PX * part.scale);
  const unit = PX * part.scale;
  const verdicts = Object.fromEntries(view.leads.map((lead) => [lead.id, lead.verdict])) as Record<string, Verdict>;
  return (
    <div aria-hidden="true" style={{ width: layout.width }} className="break-inside-avoid">
      <div className="relative h-7">
        {layout.lanes.map((lane, index) => <span key={lane.x} style={{ left: lane.x, width: lane.width }} className="absolute border-b-2 border-ink text-sm font-bold">{LANE_NAMES[index]}</span>)}
      </div>
      <div className="relative" style={{ width: layout.width, height: layout.height }}>
        <ChartTracks layout={layout} verdicts={verdicts} />
        {layout.cards.map((box) => {
          const card = view.cards.find((one) => one.id === box.id);
          const tapeHeight = part.metrics.tapeHeight * unit;
          return (
            <div key={box.id} style={{ left: box.x, top: box.y, width: box.width, height: box.height }} className="absolute border border-line bg-bench">
              <div style={{ height: tapeHeight }} className="tape flex flex-col items-center justify-center leading-none print:border print:border-ink print:[clip-path:none]">
                {(names.get(box.id) ?? []).map((line, index) => <span key={index} style={{ fontSize: line.size * unit }} className="whitespace-nowrap">{line.spans.map((span) => span.text).join("")}</span>)}
              </div>
              {layout.jacks.filter((jack) => jack.cardId === box.id).map((jack) => (
                <span
                  key={jack.id}
                  style={{ top: jack.y - box.y - 8 * unit, fontSize: 10 * unit, lineHeight: `${14 * unit}px` }}
                  className={clsx("absolute max-w-full truncate px-1", jack.side === "in" ? "left-0 border-l-4 border-ink" : "right-0 border-r-4 border-ink text-right")}
                >
                  {card?.jackNames[jack.id]}
                </span>
              ))}
            </div>
          );
        })}
        {layout.tags.map((tag) => {
          const isDanger = view.leads.some((lead) => lead.isDanger && tag.leadIds.includes(lead.id));
          return (
            <span key={`${tag.end}:${tag.jackId}`} style={{ left: tag.x, top: tag.y, width: tag.width, height: tag.height, fontSize: TAG_SIZE * unit }} className={clsx("absolute flex items-center font-tape font-extrabold leading-none", tag.end === "in" ? "justify-end pr-2" : "justify-start pl-1")}>
              <span className={clsx("flex h-full items-center border border-ink px-1", isDanger ? "bg-ink text-bench print:[print-color-adjust:exact]" : "bg-raised")}>{tagText(view, tag.leadIds)}</span>
            </span>
          );
        })}
      </div>
    </div>
  );
}
