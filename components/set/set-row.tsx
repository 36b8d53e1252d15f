"use client";
import { useSortable } from "@dnd-kit/sortable";
import { CSS } from "@dnd-kit/utilities";
import clsx from "clsx";
import Link from "next/link";
import type { Verdict } from "@/lib/core/electrics/jacks";
import { paths } from "@/lib/paths";
import { VerdictWord } from "../chart/verdict-word";
import { Button } from "../ui/button";

export interface SetSong {
  id: string;
  title: string;
  tempoBpm: number | null;
  leadCount: number;
  worst: Verdict;
}

interface SetRowProps {
  rigId: string;
  song: SetSong;
  place: number;
  isLast: boolean;
  canEdit: boolean;
  onMove: (step: 1 | -1) => void;
  onRemove: () => void;
}

export function SetRow({ rigId, song, place, isLast, canEdit, onMove, onRemove }: SetRowProps) {
  const { attributes, listeners, setNodeRef, setActivatorNodeRef, transform, transition, isDragging } = useSortable({ id: song.id, disabled: !canEdit });
  return (
    <li
      ref={setNodeRef}
      data-set-song={song.title}
      style={{ transform: CSS.Translate.toString(transform), transition: transition }}
      className={clsx("flex flex-wrap items-center gap-x-4 gap-y-2 bg-bench p-3", isDragging && "relative z-10 outline-3 outline-mark")}
    >
      <span className="w-8 font-mono text-xl font-bold">{place}</span>
      <button
        type="button"
        ref={setActivatorNodeRef}
        {...attributes}
        {...listeners}
        aria-disabled={undefined}
        aria-roledescription="song"
        aria-label={`${song.title}, place ${place}`}
        disabled={!canEdit}
        className="tape min-w-0 max-w-full touch-none truncate px-3 py-0.5 text-2xl leading-tight disabled:cursor-default"
      >
        {song.title}
      </button>
      <span className="text-ink-soft">{song.tempoBpm === null ? "" : `${song.tempoBpm} bpm · `}{song.leadCount} {song.leadCount === 1 ? "lead" : "leads"}</span>
      {song.leadCount > 0 ? <VerdictWord verdict={song.worst} /> : null}
      <span className="ml-auto flex flex-wrap items-center gap-3">
        <Link className="inline-flex min-h-9 items-center underline" href={paths.board(rigId, song.id)}>Board</Link>
        <Link className="inline-flex min-h-9 items-center underline" href={paths.sheet(rigId, song.id)}>Sheet</Link>
        {canEdit ? (
          <>
            <Button aria-label={`Move ${song.title} up`} disabled={place === 1} onClick={() => onMove(-1)}>Up</Button>
            <Button aria-label={`Move ${song.title} down`} disabled={isLast} onClick={() => onMove(1)}>Down</Button>
            <Button aria-label={`Take ${song.title} out of the set`} onClick={onRemove}>Take out</Button>
          </>
        ) : null}
      </span>
    </li>
  );
}
