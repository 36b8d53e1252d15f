"use client";

import Link from "next/link";
import { Table, Td, Th } from "@/components/ui/table";
import { Tape } from "@/components/ui/tape";
import { paths } from "@/lib/paths";
import { AssumedCount } from "./assumed-mark";
import { GearRowActions, type RowActions } from "./gear-row-actions";
import { COLUMNS, type Column, type GearQuery, type GearRow } from "./gear-rows";
import { COLUMN_WORD } from "./gear-words";

interface GearTableProps {
  rows: GearRow[];
  query: GearQuery;
  sortBy: (column: Column) => void;
  actions: RowActions;
}

/** The list where there is room for one; on a phone the cards stand in. */
export function GearTable({ rows, query, sortBy, actions }: GearTableProps) {
  return (
    <div className="hidden overflow-x-auto md:block">
      <Table>
        <caption className="sr-only">Gear of this rig. Each column&apos;s heading sorts by it.</caption>
        <thead>
          <tr>
            {COLUMNS.map((column) => <SortHeading key={column} column={column} query={query} sortBy={sortBy} />)}
            <Th><span className="sr-only">What to do with it</span></Th>
          </tr>
        </thead>
        <tbody>
          {rows.map((row) => (
            <tr key={row.gear.id} className={row.gear.retired ? "text-ink-soft" : undefined}>
              <th scope="row" className="border-b border-line-soft px-2 py-1.5 align-top">
                <Link href={paths.gear(actions.rigId, row.gear.id)} className="inline-block min-w-32 max-w-72"><Tape size="small">{row.gear.name}</Tape></Link>
              </th>
              <Td className="whitespace-nowrap">{row.kind}</Td>
              <Td className="max-w-96">{row.figures || "—"}</Td>
              <Td><AssumedCount count={row.assumed} /></Td>
              <Td>{row.supply || "—"}</Td>
              <Td className="whitespace-nowrap">{row.state}</Td>
              <Td className="py-1"><GearRowActions gear={row.gear} actions={actions} /></Td>
            </tr>
          ))}
        </tbody>
      </Table>
    </div>
  );
}

function SortHeading({ column, query, sortBy }: { column: Column; query: GearQuery; sortBy: (column: Column) => void }) {
  const here = query.sort === column;
  return (
    <Th aria-sort={here ? (query.descending ? "descending" : "ascending") : undefined}>
      <button type="button" className="flex min-h-8 items-center gap-1 font-bold hover:underline" onClick={() => sortBy(column)}>
        {COLUMN_WORD[column]}
        <span aria-hidden className={here ? undefined : "text-ink-soft"}>{here ? (query.descending ? "↓" : "↑") : "↕"}</span>
      </button>
    </Th>
  );
}
