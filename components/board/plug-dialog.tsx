"use client";
import { useState, type KeyboardEvent } from "react";
import { VerdictWord } from "../chart/verdict-word";
import { Dialog } from "../ui/dialog";
import { TextInput } from "../ui/inputs";
import { severityOf } from "@/lib/core/electrics/judge/order-verdicts";
import type { Verdict } from "@/lib/core/electrics/jacks";

export interface PlugChoice {
  jackId: string;
  label: string;
}

interface PlugDialogProps {
  title: string | null;
  choices: readonly PlugChoice[];
  would: ReadonlyMap<string, { verdict: Verdict; text: string }>;
  isLoading: boolean;
  onChoose: (jackId: string) => void;
  onClose: () => void;
}

/** The list of jacks a lead could go to, each with the verdict it would get, best first. */
export function PlugDialog({ title, choices, would, isLoading, onChoose, onClose }: PlugDialogProps) {
  return (
    <Dialog open={title !== null} title={title ?? ""} onClose={onClose}>
      <PlugList choices={choices} would={would} isLoading={isLoading} onChoose={onChoose} />
    </Dialog>
  );
}

function PlugList({ choices, would, isLoading, onChoose }: Omit<PlugDialogProps, "title" | "onClose">) {
  const [text, setText] = useState("");
  const [at, setAt] = useState(0);
  const wanted = text.trim().toLowerCase();
  const shown = choices
    .filter((choice) => choice.label.toLowerCase().includes(wanted))
    .map((choice, index) => ({ ...choice, outcome: would.get(choice.jackId), index }))
    .sort((a, b) => rank(a.outcome?.verdict) - rank(b.outcome?.verdict) || a.index - b.index);
  const active = shown[Math.min(at, shown.length - 1)];

  function onKeyDown(event: KeyboardEvent) {
    if (event.key === "ArrowDown" || event.key === "ArrowUp") {
      event.preventDefault();
      const next = Math.max(0, Math.min(shown.length - 1, at + (event.key === "ArrowDown" ? 1 : -1)));
      setAt(next);
      document.getElementById(`plug-${shown[next]?.jackId}`)?.scrollIntoView({ block: "nearest" });
    }
    if (event.key === "Enter" && active) {
      event.preventDefault();
      onChoose(active.jackId);
    }
  }

  return (
    <div className="flex flex-col gap-3" onKeyDown={onKeyDown}>
      <label className="flex flex-col gap-1 font-semibold">
        Find a jack
        <TextInput
          autoFocus
          role="combobox"
          aria-expanded="true"
          aria-controls="plug-list"
          aria-activedescendant={active ? `plug-${active.jackId}` : undefined}
          value={text}
          onChange={(event) => {
            setText(event.target.value);
            setAt(0);
          }}
        />
      </label>
      <p className="text-sm text-ink-soft">{isLoading ? "Asking what each would get…" : "Arrow keys and Enter choose; Escape leaves."}</p>
      {shown.length === 0 ? <p>No free jack fits that.</p> : null}
      <ul id="plug-list" role="listbox" aria-label="Free jacks" className="max-h-[50dvh] overflow-y-auto border border-line">
        {shown.map((choice) => (
          <li
            key={choice.jackId}
            id={`plug-${choice.jackId}`}
            role="option"
            aria-selected={choice === active}
            onClick={() => onChoose(choice.jackId)}
            className={`flex min-h-11 cursor-pointer flex-wrap items-center justify-between gap-x-4 gap-y-0.5 border-b border-line-soft px-3 py-1.5 ${choice === active ? "border-l-8 border-l-ink bg-raised font-semibold" : "hover:bg-raised"}`}
          >
            <span>{choice.label}</span>
            {choice.outcome ? <VerdictWord verdict={choice.outcome.verdict} /> : null}
            {choice === active && choice.outcome ? <span className="w-full text-sm font-normal text-ink-soft">{choice.outcome.text}</span> : null}
          </li>
        ))}
      </ul>
    </div>
  );
}

function rank(verdict: Verdict | undefined): number {
  return verdict === undefined ? 100 : severityOf(verdict);
}
