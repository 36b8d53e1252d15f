import clsx from "clsx";
import { AssumedMark } from "./assumed-mark";
import type { ShownFigure } from "./view-figures";

/** Figures to read: words, value, and whether anybody measured it. */
export function FigureList({ figures, narrow = false }: { figures: ShownFigure[]; narrow?: boolean }) {
  if (figures.length === 0) return null;
  return (
    <dl className={clsx("grid grid-cols-1 gap-x-8 self-start sm:grid-cols-2", narrow ? null : "lg:grid-cols-3")}>
      {figures.map((figure) => (
        <div key={figure.path} className="flex items-baseline justify-between gap-3 border-b border-line-soft py-1.5">
          <dt className="text-ink-soft">{figure.label}</dt>
          <dd className="flex flex-wrap items-baseline justify-end gap-x-2 text-right">
            <span className="font-mono tabular-nums">{figure.text}</span>
            {figure.assumed ? <AssumedMark /> : null}
          </dd>
        </div>
      ))}
    </dl>
  );
}
