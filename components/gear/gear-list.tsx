"use client";

import { useEffect, useRef, useState } from "react";
import { Button, ButtonLink } from "@/components/ui/button";
import { EmptyState } from "@/components/ui/empty-state";
import { Notice } from "@/components/ui/notice";
import { PageHeader } from "@/components/ui/page-header";
import { paths } from "@/lib/paths";
import { rightToEditGear, type Can } from "@/lib/rights/can";
import type { Gear } from "@/lib/schemas/gear";
import { GearCards } from "./gear-cards";
import { GearFilters } from "./gear-filters";
import { arrangeGearRows, buildGearRows } from "./gear-rows";
import { GearTable } from "./gear-table";
import { RetireDialog } from "./retire-dialog";
import { useGearActions } from "./use-gear-actions";
import { useGearQuery } from "./use-gear-query";

interface GearListProps {
  rigId: string;
  /** Retired gear included. */
  gear: Gear[];
  can: Can;
}

interface Said {
  text: string;
  /** What can be taken back. */
  undo?: Gear;
  failed?: boolean;
}

const plural = (n: number, one: string, many: string) => `${n} ${n === 1 ? one : many}`;

const countWords = (inUse: number, retired: number, assumed: number): string =>
  [
    plural(inUse, "piece in use", "pieces in use"),
    retired > 0 ? `, ${retired} retired` : "",
    assumed > 0 ? `; ${plural(assumed, "figure is", "figures are")} still assumed` : "",
    ".",
  ].join("");

/** Everything the rig owns, to find, sort, copy and retire. */
export function GearList({ rigId, gear, can }: GearListProps) {
  const { query, change, sortBy } = useGearQuery();
  const { busyId, copy, retire } = useGearActions(rigId);
  const [retiring, setRetiring] = useState<Gear | null>(null);
  const [said, setSaid] = useState<Said | null>(null);
  const notice = useRef<HTMLDivElement>(null);
  useEffect(() => {
    if (said) notice.current?.focus();
  }, [said]);

  const rows = buildGearRows(gear);
  const shown = arrangeGearRows(rows, query);
  const inUse = gear.filter((item) => !item.retired);
  const assumed = inUse.reduce((sum, item) => sum + item.assumed.length, 0);
  const filtered = query.text !== "" || query.kind !== null || query.assumedOnly;
  const mayAdd = can.editGear || can.editDesk;

  const copyGear = async (item: Gear) => {
    const outcome = await copy(item.id);
    setSaid(outcome.ok ? { text: `Copied as “${outcome.gear.name}”, at the end of the rig's order.` } : { text: outcome.message, failed: true });
  };
  const setRetired = async (item: Gear, retired: boolean) => {
    const outcome = await retire(item.id, retired);
    setRetiring(null);
    if (!outcome.ok) setSaid({ text: outcome.message, failed: true });
    else setSaid(retired ? { text: `“${item.name}” is retired.`, undo: item } : { text: `“${item.name}” is back in use.` });
  };
  const rowActions = {
    rigId,
    busyId,
    mayEdit: (item: Gear) => can[rightToEditGear(item.kind)],
    onCopy: (item: Gear) => void copyGear(item),
    onRetire: setRetiring,
    onBringBack: (item: Gear) => void setRetired(item, false),
  };

  return (
    <div className="mx-auto max-w-6xl">
      <PageHeader
        title="Gear"
        actions={mayAdd && gear.length > 0 ? <ButtonLink tone="primary" href={paths.newGear(rigId)}>{can.editGear ? "Add gear" : "Add a desk channel"}</ButtonLink> : null}
      >
        {gear.length > 0 ? countWords(inUse.length, gear.length - inUse.length, assumed) : null}
      </PageHeader>

      {said ? (
        <div ref={notice} tabIndex={-1} className="mb-4">
          <Notice tone={said.failed ? "error" : "done"} live>
            <div className="flex flex-wrap items-center gap-x-4 gap-y-2">
              <span>{said.text}</span>
              {said.undo ? <Button disabled={busyId !== null} onClick={() => said.undo && void setRetired(said.undo, false)}>Undo</Button> : null}
            </div>
          </Notice>
        </div>
      ) : null}

      {gear.length === 0 ? (
        <EmptyState
          title="No gear yet"
          action={can.editGear ? <ButtonLink tone="primary" href={paths.newGear(rigId, "pad")}>Add what you hit</ButtonLink> : null}
        >
          {can.editGear
            ? "Start with a pad: what you hit. It comes with starting figures, marked as assumed, so nothing needs measuring before the first run is on the board. Then a conditioner and a voice."
            : "Its performer or a collaborator adds gear first."}
        </EmptyState>
      ) : (
        <>
          <GearFilters query={query} change={change} retiredCount={gear.length - inUse.length} />
          <p role="status" className="my-3 text-sm text-ink-soft">
            {shown.length === rows.length ? `All ${rows.length} shown.` : `${shown.length} of ${rows.length} shown.`}
          </p>
          {shown.length === 0 ? (
            <EmptyState
              title="Nothing matches"
              action={<Button onClick={() => change({ text: "", kind: null, assumedOnly: false, retired: !filtered })}>{filtered ? "Show everything" : "Show retired gear"}</Button>}
            >
              {filtered ? "No gear fits what you are looking for." : "All gear of this rig is retired."}
            </EmptyState>
          ) : (
            <>
              <GearTable rows={shown} query={query} sortBy={sortBy} actions={rowActions} />
              <GearCards rows={shown} actions={rowActions} />
            </>
          )}
        </>
      )}
      <RetireDialog gear={retiring} busy={busyId !== null} onRetire={(item) => void setRetired(item, true)} onCancel={() => setRetiring(null)} />
    </div>
  );
}
