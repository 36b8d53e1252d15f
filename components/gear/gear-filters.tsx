"use client";

import { Checkbox, Select, TextInput } from "@/components/ui/inputs";
import { Field } from "@/components/ui/field";
import { GEAR_KINDS, type GearKind } from "@/lib/schemas/gear";
import { COLUMNS, type Column, type GearQuery } from "./gear-rows";
import { COLUMN_WORD, KIND_WORD } from "./gear-words";

interface GearFiltersProps {
  query: GearQuery;
  change: (part: Partial<GearQuery>) => void;
  retiredCount: number;
}

export function GearFilters({ query, change, retiredCount }: GearFiltersProps) {
  return (
    <search className="grid grid-cols-2 items-end gap-x-5 gap-y-3 md:flex md:flex-wrap">
      <div className="col-span-2 md:w-72">
        <Field id="gear-find" label="Find">
          <TextInput id="gear-find" type="search" value={query.text} maxLength={80} autoComplete="off" placeholder="name, figure, jack, note" onChange={(event) => change({ text: event.target.value })} />
        </Field>
      </div>
      <Field id="gear-kind" label="Kind">
        <Select id="gear-kind" value={query.kind ?? ""} onChange={(event) => change({ kind: (event.target.value || null) as GearKind | null })}>
          <option value="">Every kind</option>
          {GEAR_KINDS.map((kind) => <option key={kind} value={kind}>{KIND_WORD[kind]}</option>)}
        </Select>
      </Field>
      <div className="md:hidden">
        <Field id="gear-sort" label="Order">
          <Select id="gear-sort" value={orderValue(query)} onChange={(event) => change(readOrder(event.target.value))}>
            <option value="">As in the rig</option>
            {COLUMNS.map((column) => <option key={column} value={column}>{COLUMN_WORD[column]}, up</option>)}
            {COLUMNS.map((column) => <option key={column} value={`${column} down`}>{COLUMN_WORD[column]}, down</option>)}
          </Select>
        </Field>
      </div>
      <Checkbox className="col-span-2" id="gear-assumed" label="Only with assumed figures" checked={query.assumedOnly} onChange={(event) => change({ assumedOnly: event.target.checked })} />
      {retiredCount > 0 || query.retired ? (
        <Checkbox className="col-span-2" id="gear-retired" label={`Retired too (${retiredCount})`} checked={query.retired} onChange={(event) => change({ retired: event.target.checked })} />
      ) : null}
    </search>
  );
}

const orderValue = ({ sort, descending }: GearQuery): string => (sort === null ? "" : `${sort}${descending ? " down" : ""}`);

function readOrder(value: string): Pick<GearQuery, "sort" | "descending"> {
  const [column, way] = value.split(" ");
  return { sort: (COLUMNS.find((known) => known === column) ?? null) satisfies Column | null, descending: way === "down" };
}
