"use client";
import { closestCenter, DndContext, DragOverlay, KeyboardCode, KeyboardSensor, PointerSensor, useSensor, useSensors, type Announcements, type CollisionDetection, type DragEndEvent, type DragStartEvent, type Modifier } from "@dnd-kit/core";
import { SortableContext, sortableKeyboardCoordinates, verticalListSortingStrategy } from "@dnd-kit/sortable";
import { memo, useId, useMemo, useState } from "react";
import type { Chain, ChartLayout, PlacedJack } from "@/lib/core/chart";
import type { Verdict } from "@/lib/core/electrics/jacks";
import { severityOf } from "@/lib/core/electrics/judge/order-verdicts";
import type { LeadCheck, PatchCheck } from "@/lib/core/electrics/patch-types";
import type { Gear } from "@/lib/schemas/gear";
import type { Lead, Patch } from "@/lib/schemas/patch";
import { ChartTracks } from "../chart/chart-tracks";
import { BoardCard } from "./board-card";
import { LANE_NAMES } from "./board-lanes";
import { FONT_PX, FOOT_HEIGHT, scaledMetrics } from "./board-metrics";
import type { Names } from "./describe-changes";
import { dragDataOf, type Grabbed } from "./drag-data";
import { LeadTag } from "./lead-tag";
import { PlugSurface } from "./plug-surface";

interface BoardCanvasProps {
  cards: readonly Gear[];
  layout: ChartLayout;
  scale: number;
  isCompact: boolean;
  patch: Patch;
  check: PatchCheck;
  names: Names;
  chain: Chain | null;
  pickedLeadId: string | null;
  pickedCardId: string | null;
  canEdit: boolean;
  onPickLead: (leadId: string) => void;
  onPickCard: (cardId: string) => void;
  onKnobs: (cardId: string) => void;
  onUnplug: (leadIds: readonly string[]) => void;
  onJackDrag: (jackId: string | null) => void;
  onPlug: (a: string, b: string) => void;
  onMoveEnd: (leadId: string, inputId: string) => void;
  onMoveCard: (cardId: string, overId: string) => void;
}

/** Cards are dropped among their own lane; leads are looked up by the plugging surface. */
const collide: CollisionDetection = (args) => {
  const active = dragDataOf(args.active.data.current);
  if (active?.type !== "card") return [];
  const droppableContainers = args.droppableContainers.filter((container) => {
    const target = dragDataOf(container.data.current);
    return target?.type === "card" && target.lane === active.lane;
  });
  return closestCenter({ ...args, droppableContainers });
};

/** What is dragged from the plugging surface hangs at the pointer: below a mouse, above a finger, never over the verdict it would get. */
const atPointer: Modifier = ({ active, activatorEvent, draggingNodeRect, transform }) => {
  if (dragDataOf(active?.data.current)?.type !== "plug" || !(activatorEvent instanceof PointerEvent) || !draggingNodeRect) return transform;
  const below = activatorEvent.pointerType === "mouse" ? 18 : -60;
  return { ...transform, x: transform.x + activatorEvent.clientX - draggingNodeRect.left + 14, y: transform.y + activatorEvent.clientY - draggingNodeRect.top + below };
};

/** Enter stays free to pick a card or unfold it. */
const DRAG_KEYS = { start: [KeyboardCode.Space], cancel: [KeyboardCode.Esc], end: [KeyboardCode.Space, KeyboardCode.Enter, KeyboardCode.Tab] };
const NO_JACKS: readonly PlacedJack[] = [];
const NO_KNOBS: Patch["knobs"] = [];

/** Lanes of cards with their leads. Nothing is laid out anew while something is dragged. */
export const BoardCanvas = memo(function BoardCanvas(props: BoardCanvasProps) {
  const { cards, layout, scale, patch, check, names, chain, canEdit } = props;
  const [dragged, setDragged] = useState<string | null>(null);
  const contextId = useId();
  const sensors = useSensors(useSensor(PointerSensor, { activationConstraint: { distance: 6 } }), useSensor(KeyboardSensor, { coordinateGetter: sortableKeyboardCoordinates, keyboardCodes: DRAG_KEYS }));
  const metrics = scaledMetrics(scale, props.isCompact);
  const footHeight = FOOT_HEIGHT * scale;

  const jacksOf = useMemo(() => {
    const groups = new Map<string, PlacedJack[]>();
    for (const jack of layout.jacks) groups.set(jack.cardId, [...(groups.get(jack.cardId) ?? []), jack]);
    return groups;
  }, [layout]);
  const knobsOf = useMemo(() => {
    const groups = new Map<string, Patch["knobs"]>();
    for (const knob of patch.knobs) groups.set(knob.gearId, [...(groups.get(knob.gearId) ?? []), knob]);
    return groups;
  }, [patch.knobs]);
  const plugged = useMemo(() => new Set(patch.leads.flatMap((lead) => [lead.outputId, lead.inputId])), [patch.leads]);
  const leadsById = useMemo(() => new Map(patch.leads.map((lead) => [lead.id, lead])), [patch.leads]);
  const verdicts = useMemo(() => Object.fromEntries(Object.values(check.leads).map((lead) => [lead.leadId, lead.verdict])) as Record<string, Verdict>, [check]);
  const boxes = useMemo(() => new Map(layout.cards.map((box) => [box.id, box])), [layout]);
  const lanes = useMemo(() => LANE_NAMES.map((_, lane) => layout.cards.filter((box) => box.lane === lane).map((box) => box.id)), [layout]);
  const nameOf = (id: string) => cards.find((card) => card.id === id)?.name ?? "card";

  const announcements: Announcements = {
    onDragStart: ({ active }) => `Picked up ${describe(active.id, active.data.current)}.`,
    onDragOver: ({ active, over }) => (over ? `${describe(active.id, active.data.current)} is over ${describe(over.id, over.data.current)}.` : undefined),
    onDragEnd: ({ active, over }) => (over ? `${describe(active.id, active.data.current)} put down at ${describe(over.id, over.data.current)}.` : `${describe(active.id, active.data.current)} put down.`),
    onDragCancel: ({ active }) => `${describe(active.id, active.data.current)} is back where it was.`,
  };

  function describe(id: string | number, data: unknown): string {
    const item = dragDataOf(data);
    return item?.type === "card" ? nameOf(item.cardId) : item?.type === "plug" ? "a lead" : String(id);
  }

  function onDragStart({ active }: DragStartEvent) {
    const item = dragDataOf(active.data.current);
    if (item?.type === "card") setDragged(nameOf(item.cardId));
  }

  function onDragEnd({ active, over }: DragEndEvent) {
    const [item, target] = [dragDataOf(active.data.current), dragDataOf(over?.data.current)];
    setDragged(null);
    if (item?.type === "card" && target?.type === "card") props.onMoveCard(item.cardId, target.cardId);
  }

  function onGrab(grabbed: Grabbed | null) {
    const lead = grabbed?.type === "lead" ? leadsById.get(grabbed.leadId) : undefined;
    const jackId = grabbed?.type === "jack" ? grabbed.jackId : (lead?.outputId ?? null);
    setDragged(lead ? `Lead ${lead.number}` : jackId === null ? null : names.jack(jackId));
    props.onJackDrag(jackId);
  }

  function onDrop(grabbed: Grabbed, jackId: string | null) {
    if (grabbed.type === "jack") {
      if (jackId !== null) props.onPlug(grabbed.jackId, jackId);
    } else if (jackId !== null) props.onMoveEnd(grabbed.leadId, jackId);
    else props.onUnplug([grabbed.leadId]);
  }

  return (
    <DndContext
      id={contextId}
      sensors={sensors}
      collisionDetection={collide}
      accessibility={{ announcements, screenReaderInstructions: { draggable: "Enter brings the card's chain forward, or unfolds it. Space picks the card up; arrow keys move it within its lane; Space puts it down, Escape puts it back." } }}
      onDragStart={onDragStart}
      onDragEnd={onDragEnd}
      onDragCancel={() => setDragged(null)}
    >
      <PlugSurface canEdit={canEdit} onGrab={onGrab} onDrop={onDrop}>
        <div style={{ width: layout.width, fontSize: FONT_PX * scale }}>
          <div className="relative h-8" aria-hidden="true">
            {layout.lanes.map((lane, index) => (
              <span key={lane.x} style={{ left: lane.x, width: lane.width }} className="absolute border-b-2 border-line text-base font-bold text-ink-soft">{LANE_NAMES[index]}</span>
            ))}
          </div>
          <div className="relative" style={{ width: layout.width, height: layout.height + 8 }}>
            <ChartTracks layout={layout} verdicts={verdicts} chain={chain?.leadIds ?? null} onPick={props.onPickLead} />
            {lanes.map((ids, lane) => (
              <SortableContext key={LANE_NAMES[lane]} id={LANE_NAMES[lane]} items={ids} strategy={verticalListSortingStrategy}>
                <div role="group" aria-label={LANE_NAMES[lane]}>
                  {cards.map((gear) => {
                    const box = boxes.get(gear.id);
                    if (!box || box.lane !== lane) return null;
                    return (
                      <BoardCard
                        key={gear.id}
                        gear={gear}
                        box={box}
                        jacks={jacksOf.get(gear.id) ?? NO_JACKS}
                        plugged={plugged}
                        knobs={knobsOf.get(gear.id) ?? NO_KNOBS}
                        isDim={chain !== null && !chain.cardIds.has(gear.id)}
                        isPicked={props.pickedCardId === gear.id}
                        canEdit={canEdit}
                        tapeHeight={metrics.tapeHeight}
                        rowHeight={metrics.jackPitch}
                        footHeight={gear.knobs.length > 0 ? footHeight : 0}
                        onPick={props.onPickCard}
                        onKnobs={props.onKnobs}
                      />
                    );
                  })}
                </div>
              </SortableContext>
            ))}
            {layout.tags.map((tag) => {
              const leads = tag.leadIds.map((id) => leadsById.get(id)).filter((lead): lead is Lead => lead !== undefined);
              const first = leads[0];
              if (!first) return null;
              return (
                <LeadTag
                  key={`${tag.end}:${tag.jackId}`}
                  tag={tag}
                  leads={leads}
                  check={worstOf(leads, check)}
                  label={tag.end === "in" ? `${names.jack(first.outputId)} to ${names.jack(first.inputId)}` : `at ${names.jack(first.outputId)}`}
                  isDim={chain !== null && !leads.some((lead) => chain.leadIds.has(lead.id))}
                  pickedLeadId={leads.some((lead) => lead.id === props.pickedLeadId) ? props.pickedLeadId : null}
                  showsVolts={!props.isCompact}
                  canEdit={canEdit}
                  onPick={props.onPickLead}
                  onUnplug={props.onUnplug}
                />
              );
            })}
          </div>
        </div>
      </PlugSurface>
      <DragOverlay dropAnimation={null} modifiers={[atPointer]} className="pointer-events-none">
        {dragged ? <span className="tape pointer-events-none inline-block px-3 py-1 text-xl whitespace-nowrap shadow-lg">{dragged}</span> : null}
      </DragOverlay>
    </DndContext>
  );
});

/** The worst of leads that share a jack: no tag may look better than a lead it stands for. */
function worstOf(leads: readonly Lead[], check: PatchCheck): LeadCheck | undefined {
  return leads.map((lead) => check.leads[lead.id]).filter((lead) => lead !== undefined).sort((a, b) => severityOf(b.verdict) - severityOf(a.verdict))[0];
}
