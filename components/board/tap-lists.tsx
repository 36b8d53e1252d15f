"use client";
import { clockText } from "@/lib/core/chart";
import type { Gear } from "@/lib/schemas/gear";
import type { KnobPosition } from "@/lib/schemas/patch";

const ROW = "flex min-h-12 w-full items-center gap-3 border-t border-line-soft px-1 text-left";

/** On a phone: every output with a way to plug it, since there is no board to tap on. */
export function JackList({ cards, onOpen }: { cards: readonly Gear[]; onOpen: (jackId: string) => void }) {
  return (
    <details className="bg-bench p-3">
      <summary className="min-h-11 py-2 font-bold">Plug a lead</summary>
      <ul className="flex flex-col">
        {cards.flatMap((card) => card.jacks.filter((jack) => jack.direction === "output").map((jack) => (
          <li key={jack.id}>
            <button type="button" className={ROW} onClick={() => onOpen(jack.id)}>{card.name} · {jack.name} →</button>
          </li>
        )))}
      </ul>
    </details>
  );
}

interface KnobListProps {
  cards: readonly Gear[];
  used: ReadonlySet<string>;
  knobs: readonly KnobPosition[];
  onOpen: (gearId: string) => void;
}

/** On a phone: the knobs of every box this song uses, each with where it stands. */
export function KnobList({ cards, used, knobs, onOpen }: KnobListProps) {
  const withKnobs = cards.filter((card) => card.knobs.length > 0 && (used.has(card.id) || knobs.some((knob) => knob.gearId === card.id)));
  if (withKnobs.length === 0) return null;
  return (
    <details className="bg-bench p-3">
      <summary className="min-h-11 py-2 font-bold">Knobs</summary>
      <ul className="flex flex-col">
        {withKnobs.map((card) => {
          const set = knobs.filter((knob) => knob.gearId === card.id);
          return (
            <li key={card.id}>
              <button type="button" className={`${ROW} flex-wrap justify-between`} onClick={() => onOpen(card.id)}>
                <span>Knobs of {card.name}</span>
                <span className="text-ink-soft">{set.length === 0 ? "left alone" : set.map((knob) => `${card.knobs.find(({ id }) => id === knob.knobId)?.name ?? "Knob"} ${clockText(knob.position)}`).join(", ")}</span>
              </button>
            </li>
          );
        })}
      </ul>
    </details>
  );
}
