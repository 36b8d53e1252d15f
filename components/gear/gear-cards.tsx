"use client";

import Link from "next/link";
import { Tape } from "@/components/ui/tape";
import { paths } from "@/lib/paths";
import { AssumedCount } from "./assumed-mark";
import { GearRowActions, type RowActions } from "./gear-row-actions";
import type { GearRow } from "./gear-rows";

/** The list on a phone: one card a piece. */
export function GearCards({ rows, actions }: { rows: GearRow[]; actions: RowActions }) {
  return (
    <ul className="flex flex-col gap-3 md:hidden">
      {rows.map((row) => (
        <li key={row.gear.id} className="flex flex-col gap-1 border-2 border-line-soft bg-bench p-3">
          <div className="flex flex-wrap items-center justify-between gap-2">
            <Link href={paths.gear(actions.rigId, row.gear.id)} className="inline-flex min-h-11 min-w-0 items-center"><Tape>{row.gear.name}</Tape></Link>
            <span className="text-ink-soft">{row.kind}{row.gear.retired ? ", retired" : ""}</span>
          </div>
          {row.figures ? <p>{row.figures}</p> : null}
          <p className="text-ink-soft">
            <AssumedCount count={row.assumed} words />
            {row.supply ? ` · runs on ${row.supply}` : ""}
          </p>
          <div className="-ml-1.5"><GearRowActions gear={row.gear} actions={actions} /></div>
        </li>
      ))}
    </ul>
  );
}
