import clsx from "clsx";
import type { KeyboardEvent } from "react";
import type { ChartLayout, PlacedCard, Tag } from "@/lib/core/chart";
import type { Verdict } from "@/lib/core/electrics/jacks";
import { ChartLines } from "./chart-lines";
import { VERDICT_TONE } from "./verdict-tone";

interface RunCard {
  id: string;
  name: string;
  jackNames: Readonly<Record<string, string>>;
}

interface RunLead {
  id: string;
  number: number;
  verdict: Verdict;
  /** What arrives at its input, “4.5–8.1 V”. */
  level?: string;
  /** `Kick trigger Trig to Low drum Trig` */
  label: string;
}

interface RunChartProps {
  layout: ChartLayout;
  tapeHeight: number;
  cards: readonly RunCard[];
  leads: readonly RunLead[];
  /** Says what the drawing shows, and where the same stands in words. */
  label: string;
  /** Makes every lead's tag at its input a button. */
  onPick?: (leadId: string) => void;
}

const LANE_NAMES = ["Pads", "Conditioning", "Voices", "Desk"] as const;
const HEAD = 26;
/** Mean width of a letter of the condensed tape face, in its size. */
const LETTER = 0.43;

/** A whole chart as one drawing that scales to its place: lanes, cards, leads and tags. */
export function RunChart({ layout, tapeHeight, cards, leads, label, onPick }: RunChartProps) {
  const byId = new Map(cards.map((card) => [card.id, card]));
  const verdicts = Object.fromEntries(leads.map((lead) => [lead.id, lead.verdict]));
  return (
    <svg viewBox={`0 ${-HEAD} ${layout.width} ${layout.height + HEAD}`} role={onPick ? "group" : "img"} aria-label={label} className="block h-auto w-full">
      {layout.lanes.map((lane, index) => (
        <g key={lane.x} aria-hidden="true">
          <text x={lane.x} y={-HEAD + 14} className="fill-ink-soft text-sm font-bold">{LANE_NAMES[index]}</text>
          <line x1={lane.x} x2={lane.x + lane.width} y1={-HEAD + 20} y2={-HEAD + 20} strokeWidth="2" className="stroke-line" />
        </g>
      ))}
      <g aria-hidden="true"><ChartLines layout={layout} verdicts={verdicts} /></g>
      {layout.cards.map((box) => <RunCardDrawing key={box.id} box={box} card={byId.get(box.id)} layout={layout} tapeHeight={tapeHeight} />)}
      {layout.tags.map((tag) => <RunTag key={tag.jackId} tag={tag} leads={leads.filter((lead) => tag.leadIds.includes(lead.id))} onPick={onPick} />)}
    </svg>
  );
}

function RunCardDrawing({ box, card, layout, tapeHeight }: { box: PlacedCard; card: RunCard | undefined; layout: ChartLayout; tapeHeight: number }) {
  const room = box.width - 14;
  const name = card?.name ?? "";
  const size = tapeHeight * 0.82;
  return (
    <g aria-hidden="true">
      <rect x={box.x} y={box.y} width={box.width} height={box.height} className="fill-bench" />
      <rect x={box.x} y={box.y} width={box.width} height={tapeHeight} className="fill-tape stroke-tape-edge" />
      <text x={box.x + 7} y={box.y + tapeHeight * 0.78} fontSize={size} {...squeezed(name, size, room)} className="fill-tape-ink font-tape font-extrabold">{name}</text>
      {layout.jacks.filter((jack) => jack.cardId === box.id).map((jack) => {
        const text = card?.jackNames[jack.id] ?? "";
        return (
          <g key={jack.id}>
            <rect x={jack.x - (jack.side === "in" ? 0 : 4)} y={jack.y - 5} width="4" height="10" className="fill-ink" />
            <text x={jack.x + (jack.side === "in" ? 9 : -9)} y={jack.y + 4.5} textAnchor={jack.side === "in" ? "start" : "end"} fontSize="13" className="fill-ink">{text}</text>
          </g>
        );
      })}
    </g>
  );
}

function RunTag({ tag, leads, onPick }: { tag: Tag; leads: readonly RunLead[]; onPick?: (leadId: string) => void }) {
  const first = leads[0];
  if (!first) return null;
  const isIn = tag.end === "in";
  const numbers = leads.map((lead) => lead.number).join("+");
  const text = isIn ? [numbers, first.level, first.verdict].filter((part) => part !== undefined).join(" ") : numbers;
  const size = tag.height * 0.82;
  const width = Math.min(tag.width - 12, text.length * size * LETTER + 8);
  const x = isIn ? tag.x + tag.width - width - 12 : tag.x + 8;
  const isButton = isIn && onPick !== undefined;
  const pick = () => onPick?.(first.id);
  const asButton = isButton ? {
    role: "button", tabIndex: 0, "aria-label": `Lead ${numbers}, ${first.label}, ${[first.level, first.verdict].filter((part) => part !== undefined).join(", ")}`, onClick: pick,
    onKeyDown: (event: KeyboardEvent) => {
      if (event.key !== "Enter" && event.key !== " ") return;
      event.preventDefault();
      pick();
    },
  } : { "aria-hidden": true };
  return (
    <g {...asButton} className={clsx(isButton && "cursor-pointer")}>
      <rect x={x} y={tag.y} width={width} height={tag.height} className="fill-raised stroke-line" />
      <text x={x + width / 2} y={tag.y + tag.height * 0.78} textAnchor="middle" fontSize={size} {...squeezed(text, size, width - 6)} className="fill-ink font-tape font-bold">
        {isIn ? <>{[numbers, first.level].filter((part) => part !== undefined).join(" ")} <tspan className={clsx("fill-current", VERDICT_TONE[first.verdict])}>{first.verdict}</tspan></> : text}
      </text>
    </g>
  );
}

/** Text that would not fit is set narrower rather than cut. */
function squeezed(text: string, size: number, room: number): { textLength?: number; lengthAdjust?: "spacingAndGlyphs" } {
  return text.length * size * LETTER > room ? { textLength: room, lengthAdjust: "spacingAndGlyphs" } : {};
}
