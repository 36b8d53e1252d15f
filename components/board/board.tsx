"use client";
import { arrayMove } from "@dnd-kit/sortable";
import { useCallback, useEffect, useMemo, useRef, useState } from "react";
import { leadChain, tidyLanes } from "@/lib/core/chart";
import type { PatchCheck } from "@/lib/core/electrics/patch-types";
import type { Can } from "@/lib/rights/can";
import type { Gear } from "@/lib/schemas/gear";
import { laneOf } from "@/lib/schemas/lane-of";
import type { Lead, Patch } from "@/lib/schemas/patch";
import { useAnnounce } from "../ui/announcer";
import { Notice } from "../ui/notice";
import { BoardCanvas } from "./board-canvas";
import { PluggingContext, type Plugging } from "./board-context";
import { lanesOf, orderCards, sideOf } from "./board-lanes";
import { BoardToolbar } from "./board-toolbar";
import { ConflictDialog } from "./conflict-dialog";
import { namesOf } from "./describe-changes";
import { findGone } from "./find-gone";
import { FirstRun } from "./first-run";
import { GoneNotice } from "./gone-notice";
import { KnobDialog } from "./knob-dialog";
import { LeadPanel } from "./lead-panel";
import { PlugDialog } from "./plug-dialog";
import { RunList } from "./run-list";
import { JackList, KnobList } from "./tap-lists";
import { useBoardKeys } from "./use-board-keys";
import { useBoardLayout } from "./use-board-layout";
import { useFrameWidth } from "./use-frame-width";
import { useCandidates, usePatchCheck } from "./use-patch-check";
import { usePatchEditor } from "./use-patch-editor";

interface BoardProps {
  rigId: string;
  songId: string;
  gear: Gear[];
  patch: Patch;
  revision: number;
  check: PatchCheck;
  can: Can;
}

/** Above so many cards, those without a lead in this song fold to their tape. */
const MANY_CARDS = 12;
const NARROW_PX = 760;

export function Board(props: BoardProps) {
  const { rigId, songId, gear, can } = props;
  const canEdit = can.editPatch;
  const announce = useAnnounce();
  const editor = usePatchEditor(rigId, songId, { revision: props.revision, patch: props.patch }, canEdit);
  const { patch, edit } = editor;
  const { check, isChecking, failed } = usePatchCheck(rigId, songId, patch, { patch: props.patch, check: props.check });
  const names = useMemo(() => namesOf(gear), [gear]);
  const jacks = useMemo(() => new Map(gear.flatMap((item) => item.jacks.map((jack) => [jack.id, { jack, gear: item }] as const))), [gear]);

  const [pickedLeadId, setPickedLeadId] = useState<string | null>(null);
  const [pickedCardId, setPickedCardId] = useState<string | null>(null);
  const [armed, setArmed] = useState<string | null>(null);
  const [isDragging, setIsDragging] = useState(false);
  const [listFrom, setListFrom] = useState<string | null>(null);
  const [knobsOf, setKnobsOf] = useState<string | null>(null);
  const [view, setView] = useState<"board" | "runs">("board");
  const [fits, setFits] = useState(true);
  const [foldsFree, setFoldsFree] = useState(props.patch.leads.length > 0 && gear.length > MANY_CARDS);
  const [unfolded, setUnfolded] = useState<ReadonlySet<string>>(new Set());
  const [filter, setFilter] = useState("");
  const [putOff, setPutOff] = useState<number | null>(null);
  const [frameRef, frameWidth] = useFrameWidth();
  const isNarrow = frameWidth > 0 && frameWidth < NARROW_PX;
  const showsRuns = view === "runs" || isNarrow;

  const cards = useMemo(() => orderCards(gear, patch.lanes), [gear, patch.lanes]);
  const used = useMemo(() => new Set(patch.leads.flatMap((lead) => [jacks.get(lead.outputId)?.gear.id ?? "", jacks.get(lead.inputId)?.gear.id ?? ""])), [jacks, patch.leads]);
  const shown = useMemo(() => {
    const wanted = filter.trim().toLowerCase();
    return wanted === "" ? cards : cards.filter((card) => used.has(card.id) || card.name.toLowerCase().includes(wanted));
  }, [cards, filter, used]);
  const folded = useMemo(() => new Set(foldsFree && filter === "" ? shown.filter((card) => !used.has(card.id) && !unfolded.has(card.id)).map((card) => card.id) : []), [filter, foldsFree, shown, unfolded, used]);
  const { layout, scale, isCompact } = useBoardLayout(shown, patch.leads, folded, frameWidth, fits);
  const chain = useMemo(() => {
    const picked = { leadIds: pickedLeadId ? [pickedLeadId] : [], cardIds: pickedCardId ? [pickedCardId] : [] };
    if (!pickedLeadId && !pickedCardId) return null;
    return leadChain(patch.leads.map((lead) => ({ id: lead.id, from: lead.outputId, to: lead.inputId })), gear.map((item) => ({ id: item.id, jacks: item.jacks.map((jack) => ({ id: jack.id, side: sideOf(jack.direction) })) })), picked);
  }, [gear, patch.leads, pickedCardId, pickedLeadId]);

  const from = listFrom ?? armed;
  const candidates = useCandidates(rigId, songId, patch, from);
  const gone = useMemo(() => findGone(patch, gear), [gear, patch]);
  const picked = patch.leads.find((lead) => lead.id === pickedLeadId);

  const plug = useCallback((a: string, b: string) => {
    const [first, second] = [jacks.get(a), jacks.get(b)];
    if (!first || !second || first.jack.direction === second.jack.direction) return;
    const [outputId, inputId] = first.jack.direction === "output" ? [a, b] : [b, a];
    edit({ type: "plug", id: crypto.randomUUID(), outputId, inputId });
    announce(`Plugged ${names.jack(outputId)} into ${names.jack(inputId)}.`);
    setArmed(null);
    setListFrom(null);
  }, [announce, edit, jacks, names]);

  // The jack that takes the focus over from a tag or panel that goes with its lead.
  const refocus = useRef<string | null>(null);
  const frame = useRef<HTMLDivElement>(null);
  const unplug = useCallback((leadIds: readonly string[]) => {
    if (leadIds.length === 0) return;
    const held = document.activeElement?.closest("[data-lead-panel-frame], [data-tag-of]");
    if (held) refocus.current = patch.leads.find((lead) => lead.id === leadIds[0])?.inputId ?? null;
    edit({ type: "unplug", leadIds });
    announce(`${leadIds.length === 1 ? "Lead" : `${leadIds.length} leads`} unplugged. Control Z brings it back.`);
  }, [announce, edit, patch.leads]);

  const dragJack = useCallback((jackId: string | null) => {
    setArmed(jackId);
    setIsDragging(jackId !== null);
  }, []);
  const tap = useCallback((jackId: string) => {
    setArmed((before) => {
      if (before === null) return jackId;
      if (before === jackId) return null;
      if (jacks.get(before)?.jack.direction === jacks.get(jackId)?.jack.direction) return jackId;
      queueMicrotask(() => plug(before, jackId));
      return null;
    });
  }, [jacks, plug]);

  const plugging = useMemo((): Plugging => {
    const jack = from === null ? undefined : jacks.get(from)?.jack;
    return {
      from: from !== null && jack ? { jackId: from, side: sideOf(jack.direction) } : null,
      would: candidates.would,
      canEdit,
      tap,
      openList: setListFrom,
      unplugJack: (jackId) => unplug(patch.leads.filter((lead) => lead.outputId === jackId || lead.inputId === jackId).map((lead) => lead.id)),
    };
  }, [candidates.would, canEdit, from, jacks, patch.leads, tap, unplug]);

  const pickCard = useCallback((cardId: string) => {
    if (folded.has(cardId)) {
      setUnfolded((before) => new Set([...before, cardId]));
      return;
    }
    setPickedLeadId(null);
    setPickedCardId((before) => (before === cardId ? null : cardId));
  }, [folded]);
  const pickLead = useCallback((leadId: string) => {
    setPickedCardId(null);
    setPickedLeadId(leadId);
  }, []);
  const letGo = useCallback(() => {
    setArmed(null);
    setPickedCardId(null);
    setPickedLeadId(null);
  }, []);
  const moveCard = useCallback((cardId: string, overId: string) => {
    if (cardId === overId) return;
    const ids = cards.map((card) => card.id);
    const moved = arrayMove(cards, ids.indexOf(cardId), ids.indexOf(overId));
    edit({ type: "lanes", lanes: lanesOf(moved) });
  }, [cards, edit]);
  const moveEnd = useCallback((leadId: string, inputId: string) => {
    const lead = patch.leads.find((item) => item.id === leadId);
    if (!lead || lead.inputId === inputId || patch.leads.some((item) => item.outputId === lead.outputId && item.inputId === inputId)) return;
    const { inline: _parts, ...rest } = lead;
    edit({ type: "replace", patch: { ...patch, leads: patch.leads.map((item) => (item.id === leadId ? { ...rest, inputId } : item)) } });
  }, [edit, patch]);
  const tidy = useCallback(() => {
    const chartCards = cards.map((card) => ({ id: card.id, lane: laneOf(card.kind) ?? (0 as const), jacks: card.jacks.map((jack) => ({ id: jack.id, side: sideOf(jack.direction) })), gear: card }));
    const tidied = tidyLanes(chartCards, patch.leads.map((lead) => ({ id: lead.id, from: lead.outputId, to: lead.inputId })));
    edit({ type: "lanes", lanes: lanesOf(tidied.map((card) => card.gear)) });
    announce("Cards put in the order in which their leads cross least.");
  }, [announce, cards, edit, patch.leads]);

  const { undo: takeBack, redo: doAgain, canUndo, canRedo } = editor;
  const undo = useCallback(() => {
    if (!canUndo) return;
    takeBack();
    announce("Undone.");
  }, [announce, canUndo, takeBack]);
  const redo = useCallback(() => {
    if (!canRedo) return;
    doAgain();
    announce("Done again.");
  }, [announce, canRedo, doAgain]);
  const closePanel = useCallback(() => {
    if (pickedLeadId) document.querySelector<HTMLElement>(`[data-tag-of~="${CSS.escape(pickedLeadId)}"]`)?.focus({ preventScroll: true });
    setPickedLeadId(null);
  }, [pickedLeadId]);

  useBoardKeys({ onUndo: undo, onRedo: redo, onRuns: () => setView((before) => (before === "runs" ? "board" : "runs")), onEscape: letGo });
  useEffect(() => {
    if (!pickedLeadId) return;
    document.querySelector<HTMLElement>("[data-lead-panel]")?.focus({ preventScroll: true });
    document.querySelector<HTMLElement>("[data-lead-tag][data-picked]")?.scrollIntoView({ block: "nearest" });
  }, [pickedLeadId]);

  useEffect(() => {
    const jackId = refocus.current;
    refocus.current = null;
    if (jackId === null || document.activeElement !== document.body) return;
    const jack = document.querySelector<HTMLElement>(`[data-jack="${CSS.escape(jackId)}"]`);
    const card = jacks.get(jackId)?.gear.id;
    (jack ?? document.querySelector<HTMLElement>(`[data-card="${CSS.escape(card ?? "")}"] > .tape`) ?? frame.current)?.focus({ preventScroll: true });
  }, [jacks, patch.leads]);

  const leadLabel = useCallback((lead: Lead) => `${names.jack(lead.outputId)} → ${names.jack(lead.inputId)}`, [names]);
  const gearName = useCallback((id: string) => gear.find((item) => item.id === id)?.name ?? "?", [gear]);
  const choices = useMemo(() => {
    const start = listFrom === null ? undefined : jacks.get(listFrom);
    if (!start) return [];
    const joined = new Set(patch.leads.filter((lead) => lead.outputId === listFrom || lead.inputId === listFrom).flatMap((lead) => [lead.outputId, lead.inputId]));
    return cards.flatMap((card) => card.jacks.filter((jack) => jack.direction !== start.jack.direction && !joined.has(jack.id) && card.id !== start.gear.id && !card.retired).map((jack) => ({ jackId: jack.id, label: names.jack(jack.id) })));
  }, [cards, jacks, listFrom, names, patch.leads]);

  return (
    <PluggingContext.Provider value={plugging}>
      <div className={picked ? "pb-[50dvh]" : ""}>
        <BoardToolbar
          editor={editor} check={check} isChecking={isChecking} canEdit={canEdit} isNarrow={isNarrow} view={view} onView={setView} fits={fits} onFits={setFits}
          foldsFree={foldsFree} onFolds={(folds) => {
            setFoldsFree(folds);
            setUnfolded(new Set());
          }}
          filter={filter} onFilter={setFilter} onTidy={tidy} onUndo={undo} onRedo={redo} onAsk={() => setPutOff(null)}
        />
        {failed ? <Notice tone="error" title="Not checked" live className="mb-3">The server did not answer the check. The verdicts shown are from before; they follow with the next change.</Notice> : null}
        {gone ? <GoneNotice gone={gone} onClear={canEdit ? () => edit({ type: "replace", patch: gone.patch }) : undefined} /> : null}
        {editor.news ? <Notice tone="done" live className="mb-3">{editor.news} <button type="button" className="underline" onClick={editor.dismissNews}>Good</button></Notice> : null}
        {armed && !isDragging ? <p role="status" className="fixed bottom-4 left-1/2 z-10 max-w-[90vw] -translate-x-1/2 border-2 border-ink border-l-8 border-l-mark bg-bench px-3 py-1.5 shadow-lg"><strong>{names.jack(armed)}</strong>: now tap the other end. Escape lets go.</p> : null}
        <div ref={frameRef} className="w-full">
          {cards.length === 0 || (patch.leads.length === 0 && canEdit) ? <FirstRun rigId={rigId} gear={gear} can={can} onPlug={plug} /> : null}
          {cards.length === 0 ? null : showsRuns ? (
            <div className="flex flex-col gap-5">
              {isNarrow && canEdit ? <JackList cards={cards} onOpen={setListFrom} /> : null}
              {isNarrow ? <KnobList cards={cards} used={used} knobs={patch.knobs} onOpen={setKnobsOf} /> : null}
              <RunList check={check} leads={patch.leads} gearName={gearName} leadLabel={leadLabel} pickedLeadId={pickedLeadId} onPick={pickLead} />
            </div>
          ) : (
            <div ref={frame} className="group/board -mx-2 overflow-x-auto px-2 overflow-y-hidden pb-3" tabIndex={-1} data-checking={isChecking || undefined}>
              <BoardCanvas
                cards={shown} layout={layout} scale={scale} isCompact={isCompact} patch={patch} check={check} names={names} chain={chain} pickedLeadId={pickedLeadId} pickedCardId={pickedCardId} canEdit={canEdit}
                onPickLead={pickLead} onPickCard={pickCard} onKnobs={setKnobsOf} onUnplug={unplug} onJackDrag={dragJack} onPlug={plug} onMoveEnd={moveEnd} onMoveCard={moveCard}
              />
            </div>
          )}
        </div>
      </div>
      {picked ? (
        <LeadPanel
          rigId={rigId} gear={gear} lead={picked} from={names.jack(picked.outputId)} to={names.jack(picked.inputId)} check={check.leads[picked.id]} isChecking={isChecking}
          input={inputFigures(jacks.get(picked.inputId)?.jack)} canEdit={canEdit} edit={edit} onUnplug={unplug} onClose={closePanel}
        />
      ) : null}
      <PlugDialog title={listFrom === null ? null : `Plug ${names.jack(listFrom)} into…`} choices={choices} would={candidates.would} isLoading={candidates.isLoading} onChoose={(jackId) => listFrom !== null && plug(listFrom, jackId)} onClose={() => setListFrom(null)} />
      <KnobDialog gear={gear.find((item) => item.id === knobsOf) ?? null} knobs={patch.knobs} canEdit={canEdit} edit={edit} onClose={() => setKnobsOf(null)} />
      <ConflictDialog
        conflict={editor.conflict} isOpen={editor.conflict?.theirs.revision !== putOff} names={names} onSettle={editor.settle}
        onPutOff={() => setPutOff(editor.conflict?.theirs.revision ?? null)}
      />
    </PluggingContext.Provider>
  );
}

function inputFigures(jack: Gear["jacks"][number] | undefined) {
  return jack?.direction === "input" ? jack.input : undefined;
}
