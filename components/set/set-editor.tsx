"use client";
import { closestCenter, DndContext, KeyboardSensor, PointerSensor, useSensor, useSensors, type Announcements, type DragEndEvent } from "@dnd-kit/core";
import { arrayMove, SortableContext, sortableKeyboardCoordinates, verticalListSortingStrategy } from "@dnd-kit/sortable";
import { useId } from "react";
import { Button } from "../ui/button";
import { EmptyState } from "../ui/empty-state";
import { Notice } from "../ui/notice";
import type { SetList } from "@/lib/schemas/set";
import { SetRow, type SetSong } from "./set-row";
import { useSetEditor } from "./use-set-editor";

interface SetEditorProps {
  rigId: string;
  set: SetList;
  songs: readonly SetSong[];
  canEdit: boolean;
}

/** A set list: songs dragged (or moved by keys and buttons) into the order they are played in. */
export function SetEditor({ rigId, set, songs, canEdit }: SetEditorProps) {
  const { songIds, revision, state, change, takeTheirs, keepMine, undo, canUndo } = useSetEditor(rigId, set, canEdit);
  const contextId = useId();
  const sensors = useSensors(useSensor(PointerSensor, { activationConstraint: { distance: 6 } }), useSensor(KeyboardSensor, { coordinateGetter: sortableKeyboardCoordinates }));
  const byId = new Map(songs.map((song) => [song.id, song]));
  const outside = songs.filter((song) => !songIds.includes(song.id));
  const titleOf = (id: string | number) => byId.get(String(id))?.title ?? "song";
  const placeOf = (id: string | number) => `${songIds.indexOf(String(id)) + 1} of ${songIds.length}`;
  const announcements: Announcements = {
    onDragStart: ({ active }) => `Picked up ${titleOf(active.id)}, ${placeOf(active.id)}.`,
    onDragOver: ({ active, over }) => (over ? `${titleOf(active.id)} is at place ${placeOf(over.id)}.` : undefined),
    onDragEnd: ({ active, over }) => (over ? `${titleOf(active.id)} put down at place ${placeOf(over.id)}.` : `${titleOf(active.id)} put down.`),
    onDragCancel: ({ active }) => `${titleOf(active.id)} is back where it was.`,
  };

  function onDragEnd({ active, over }: DragEndEvent) {
    if (!over || active.id === over.id) return;
    change(arrayMove(songIds, songIds.indexOf(String(active.id)), songIds.indexOf(String(over.id))));
  }

  return (
    <div className="flex flex-col gap-5">
      {canEdit ? (
        <div className="flex flex-wrap items-center gap-4">
          <Button onClick={undo} disabled={!canUndo}>Undo</Button>
          <span role="status" className="text-ink-soft">{state.status === "saved" ? `Saved · revision ${revision}` : state.status === "saving" ? "Saving…" : ""}</span>
        </div>
      ) : null}
      {state.status === "stale" ? (
        <Notice tone="caution" title="Somebody else changed this set list" live>
          <p className="mb-2">Theirs: {state.theirs.songIds.map(titleOf).join(", ") || "empty"}.</p>
          <div className="flex flex-wrap gap-3">
            <Button onClick={takeTheirs}>Take theirs</Button>
            <Button onClick={keepMine}>Keep the order on this screen</Button>
          </div>
        </Notice>
      ) : null}
      {state.status === "refused" ? <Notice tone="error" title="Not saved" live>{state.detail} <Button onClick={() => change([...songIds])}>Try again</Button></Notice> : null}
      {songIds.length === 0 ? <EmptyState title="No song in this set yet">{canEdit ? "Add songs from the list below, then drag them into order." : "The performer puts songs in order."}</EmptyState> : (
        <DndContext id={contextId} sensors={sensors} collisionDetection={closestCenter} accessibility={{ announcements, screenReaderInstructions: { draggable: "Space picks the song up; arrow keys move it; Space puts it down, Escape puts it back." } }} onDragEnd={onDragEnd}>
          <SortableContext items={songIds} strategy={verticalListSortingStrategy}>
            <ol className="flex flex-col gap-2">
              {songIds.map((id, index) => {
                const song = byId.get(id);
                return song ? (
                  <SetRow
                    key={id} rigId={rigId} song={song} place={index + 1} isLast={index === songIds.length - 1} canEdit={canEdit}
                    onMove={(step) => change(arrayMove(songIds, index, index + step))} onRemove={() => change(songIds.filter((item) => item !== id))}
                  />
                ) : null;
              })}
            </ol>
          </SortableContext>
        </DndContext>
      )}
      {canEdit && outside.length > 0 ? (
        <section aria-labelledby={`${contextId}-rest`} className="flex flex-col gap-2">
          <h2 id={`${contextId}-rest`} className="text-xl font-bold">Not in this set</h2>
          <ul className="flex flex-wrap gap-3">
            {outside.map((song) => <li key={song.id}><Button onClick={() => change([...songIds, song.id])}>Add {song.title}</Button></li>)}
          </ul>
        </section>
      ) : null}
    </div>
  );
}
