"use client";
import { useDndMonitor, useDraggable } from "@dnd-kit/core";
import { useRef, type PointerEvent, type ReactNode } from "react";
import { dragDataOf, grabbedAt, jackUnder, type DragData, type Grabbed } from "./drag-data";

interface PlugSurfaceProps {
  canEdit: boolean;
  children: ReactNode;
  /** A jack or a lead's end was taken hold of; null: let go. */
  onGrab: (grabbed: Grabbed | null) => void;
  /** Put down on a jack, or on nothing. */
  onDrop: (grabbed: Grabbed, jackId: string | null) => void;
}

const DATA: DragData = { type: "plug" };

/**
 * Where leads are dragged. One draggable stands for every jack and tag under it, and the jack under the pointer is
 * looked up when it is needed: hundreds of jacks cost nothing while something moves.
 */
export function PlugSurface({ canEdit, children, onGrab, onDrop }: PlugSurfaceProps) {
  const { listeners, setNodeRef } = useDraggable({ id: "plug-surface", data: DATA, disabled: !canEdit });
  const grabbed = useRef<Grabbed | null>(null);
  const pointer = useRef({ x: 0, y: 0 });
  const over = useRef<HTMLElement | null>(null);

  function follow(event: globalThis.PointerEvent) {
    pointer.current = { x: event.clientX, y: event.clientY };
    const jack = grabbed.current ? jackUnder(event.clientX, event.clientY, grabbed.current) : null;
    if (jack === over.current) return;
    over.current?.removeAttribute("data-over");
    jack?.setAttribute("data-over", "");
    over.current = jack;
  }

  function letGo() {
    window.removeEventListener("pointermove", follow);
    over.current?.removeAttribute("data-over");
    over.current = null;
    onGrab(null);
  }

  useDndMonitor({
    onDragStart: ({ active }) => {
      if (dragDataOf(active.data.current)?.type !== "plug") return;
      window.addEventListener("pointermove", follow);
      onGrab(grabbed.current);
    },
    onDragEnd: ({ active }) => {
      if (dragDataOf(active.data.current)?.type !== "plug" || !grabbed.current) return;
      const jack = jackUnder(pointer.current.x, pointer.current.y, grabbed.current);
      letGo();
      onDrop(grabbed.current, jack?.dataset.jack ?? null);
    },
    onDragCancel: letGo,
  });

  function onPointerDown(event: PointerEvent) {
    const hold = event.target instanceof Element ? grabbedAt(event.target) : null;
    if (!hold) return;
    grabbed.current = hold;
    pointer.current = { x: event.clientX, y: event.clientY };
    listeners?.onPointerDown?.(event);
  }

  return <div ref={setNodeRef} onPointerDown={onPointerDown}>{children}</div>;
}
