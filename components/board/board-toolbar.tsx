"use client";
import { severityOf } from "@/lib/core/electrics/judge/order-verdicts";
import { VERDICTS } from "@/lib/core/electrics/jacks";
import type { PatchCheck } from "@/lib/core/electrics/patch-types";
import { VerdictWord } from "../chart/verdict-word";
import { Button } from "../ui/button";
import { Checkbox, TextInput } from "../ui/inputs";
import { SaveStatus } from "./save-status";
import type { PatchEditor } from "./use-patch-editor";

interface BoardToolbarProps {
  editor: PatchEditor;
  check: PatchCheck;
  isChecking: boolean;
  canEdit: boolean;
  isNarrow: boolean;
  view: "board" | "runs";
  onView: (view: "board" | "runs") => void;
  fits: boolean;
  onFits: (fits: boolean) => void;
  foldsFree: boolean;
  onFolds: (folds: boolean) => void;
  filter: string;
  onFilter: (text: string) => void;
  onTidy: () => void;
  onUndo: () => void;
  onRedo: () => void;
  onAsk: () => void;
}

/** What can be done with the whole board, and how its leads stand. */
export function BoardToolbar(props: BoardToolbarProps) {
  const { editor, check, canEdit, isNarrow, view } = props;
  const counts = [...VERDICTS].sort((a, b) => severityOf(b) - severityOf(a)).filter((verdict) => check.counts[verdict] > 0);
  return (
    <div className="mb-4 flex flex-col gap-2" data-print="hide">
      <div className="flex flex-wrap items-center gap-x-4 gap-y-2">
        {canEdit ? (
          <>
            <Button onClick={props.onUndo} disabled={!editor.canUndo} title="Ctrl+Z">Undo</Button>
            <Button onClick={props.onRedo} disabled={!editor.canRedo} title="Ctrl+Shift+Z">Redo</Button>
            {isNarrow ? null : <Button onClick={props.onTidy} title="Order the cards so that leads cross less">Tidy</Button>}
          </>
        ) : <span className="font-semibold">You can look and print; a collaborator or the performer edits.</span>}
        {isNarrow ? null : (
          <>
            <Button onClick={() => props.onView(view === "runs" ? "board" : "runs")} title="R" aria-pressed={view === "runs"}>{view === "runs" ? "Show the board" : "List of runs"}</Button>
            {view === "board" ? (
              <>
                <Checkbox label="Fit the width" checked={props.fits} onChange={(event) => props.onFits(event.target.checked)} />
                <Checkbox label="Fold unpatched cards" checked={props.foldsFree} onChange={(event) => props.onFolds(event.target.checked)} />
                <TextInput aria-label="Find a card" placeholder="Find a card" value={props.filter} onChange={(event) => props.onFilter(event.target.value)} className="max-w-40" />
              </>
            ) : null}
          </>
        )}
        <span className="ml-auto">{canEdit ? <SaveStatus state={editor.state} revision={editor.revision} onRetry={() => void editor.saveNow()} onAsk={props.onAsk} /> : null}</span>
      </div>
      <div className="flex flex-wrap items-center gap-x-5 gap-y-1" aria-live="polite" aria-busy={props.isChecking}>
        {counts.map((verdict) => (
          <span key={verdict} className="flex items-center gap-1.5"><span className="font-mono font-bold">{check.counts[verdict]}</span><VerdictWord verdict={verdict} /></span>
        ))}
        {props.isChecking ? <span className="text-ink-soft">checking…</span> : null}
      </div>
      {check.nextMeasurement ? <p><strong>Measure next:</strong> {check.nextMeasurement.text}</p> : null}
    </div>
  );
}
