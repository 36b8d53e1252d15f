"use client";

import { useEffect, useState } from "react";

interface LeaveWarning {
  /** Where the person was about to go, while the question stands. */
  leavingTo: string | null;
  stay: () => void;
}

/** Asks before a page with unsaved typing is left: the browser's own question for closing, ours for a link inside. */
export function useLeaveWarning(dirty: boolean): LeaveWarning {
  const [leavingTo, setLeavingTo] = useState<string | null>(null);

  useEffect(() => {
    if (!dirty) return;
    const beforeUnload = (event: BeforeUnloadEvent) => event.preventDefault();
    const onClick = (event: MouseEvent) => {
      const href = plainLink(event);
      if (href === null) return;
      event.preventDefault();
      event.stopPropagation();
      setLeavingTo(href);
    };
    window.addEventListener("beforeunload", beforeUnload);
    document.addEventListener("click", onClick, { capture: true });
    return () => {
      window.removeEventListener("beforeunload", beforeUnload);
      document.removeEventListener("click", onClick, { capture: true });
    };
  }, [dirty]);

  return { leavingTo, stay: () => setLeavingTo(null) };
}

/** The address inside the product that an ordinary click on a link would lead to; null for anything else. */
function plainLink(event: MouseEvent): string | null {
  if (event.button !== 0 || event.metaKey || event.ctrlKey || event.shiftKey || event.altKey) return null;
  const link = event.target instanceof Element ? event.target.closest("a[href]") : null;
  if (!(link instanceof HTMLAnchorElement) || link.target === "_blank" || link.hasAttribute("download")) return null;
  const url = new URL(link.href, location.href);
  if (url.origin !== location.origin) return null;
  if (url.pathname === location.pathname && url.search === location.search) return null;
  return `${url.pathname}${url.search}${url.hash}`;
}
