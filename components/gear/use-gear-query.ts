"use client";

import { usePathname, useSearchParams } from "next/navigation";
import { useState } from "react";
import { readGearQuery, writeGearQuery, type Column, type GearQuery } from "./gear-rows";

/**
 * The list's order and filters. They live in the address, so that a view can be kept and sent, and in
 * state as well, since an address changes in a transition and a text field must not wait for one.
 */
export function useGearQuery() {
  const params = useSearchParams();
  const pathname = usePathname();
  const [query, setQuery] = useState<GearQuery>(() => readGearQuery(params));
  const change = (part: Partial<GearQuery>) => {
    const next = { ...query, ...part };
    setQuery(next);
    const text = writeGearQuery(next);
    window.history.replaceState(null, "", text ? `${pathname}?${text}` : pathname);
  };
  /** First up, then down, then the rig's own order again. */
  const sortBy = (column: Column) => {
    if (query.sort !== column) change({ sort: column, descending: false });
    else if (!query.descending) change({ descending: true });
    else change({ sort: null, descending: false });
  };
  return { query, change, sortBy };
}
