"use client";

import { useEffect, useRef } from "react";
import { Button } from "@/components/ui/button";
import { Table, Td, Th } from "@/components/ui/table";
import type { Gear, GearInput } from "@/lib/schemas/gear";
import { describeDifference } from "./describe-difference";
import { type MergedGear } from "./merge-gear";

interface ConflictPanelProps {
  mine: GearInput;
  stored: Gear;
  supplyName: (id: string | null) => string;
  busy: boolean;
  /** The version both began from, where it is known. */
  base: GearInput | null;
  merged: MergedGear | null;
  onMerge: () => void;
  onKeepMine: () => void;
  onTakeStored: () => void;
}

/** Somebody saved first: both versions side by side, nothing lost until one is chosen. */
export function ConflictPanel({ mine, stored, base, merged, supplyName, busy, onMerge, onKeepMine, onTakeStored }: ConflictPanelProps) {
  const heading = useRef<HTMLHeadingElement>(null);
  useEffect(() => heading.current?.focus(), []);
  const rows = describeDifference(mine, stored, supplyName, base);
  return (
    <section aria-labelledby="gear-conflict" className="flex flex-col gap-3 border-l-8 border-verdict-tight bg-bench px-4 py-3">
      <h2 id="gear-conflict" ref={heading} tabIndex={-1} className="text-xl font-bold">Somebody saved this while you were typing</h2>
      <p>
        Nothing was overwritten, and what you typed is still here.{" "}
        {rows.length === 0 ? "The two versions hold the same figures." : "This is where the two differ:"}
      </p>
      {rows.length > 0 ? (
        <div className="overflow-x-auto">
          <Table className="min-w-80">
            <thead><tr><Th>What</Th><Th>Yours</Th><Th>Stored, revision {stored.revision}</Th>{base ? <Th>Changed by</Th> : null}</tr></thead>
            <tbody>
              {rows.map((row) => (
                <tr key={row.label}>
                  <th scope="row" className="border-b border-line-soft px-2 py-2 align-top font-semibold">{row.label}</th>
                  <Td className="break-words">{row.mine}</Td>
                  <Td className="break-words">{row.stored}</Td>
                  {base ? <Td>{row.changedBy}</Td> : null}
                </tr>
              ))}
            </tbody>
          </Table>
        </div>
      ) : null}
      {merged && merged.clashes > 0 ? (
        <p>{merged.clashes === 1 ? "One thing was" : `${merged.clashes} things were`} changed by both; saving both people&apos;s changes keeps yours there.</p>
      ) : null}
      <div className="flex flex-wrap gap-3">
        {merged ? <Button tone="primary" disabled={busy} onClick={onMerge}>Save both people&apos;s changes</Button> : null}
        <Button tone={merged ? "plain" : "primary"} disabled={busy} onClick={onKeepMine}>Keep only mine, save over it</Button>
        <Button disabled={busy} onClick={onTakeStored}>Take the stored one</Button>
      </div>
    </section>
  );
}
