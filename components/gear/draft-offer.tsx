"use client";

import { useState, useSyncExternalStore } from "react";
import { Button } from "@/components/ui/button";
import { Notice } from "@/components/ui/notice";
import { dropDraft, readDraft, type GearDraftKept } from "./draft-store";

interface DraftOfferProps {
  draftKey: string;
  /** The stored revision now; 0 for gear that does not exist yet. */
  revision: number;
  onRestore: (draft: GearDraftKept) => void;
}

/** Offers what was typed here before and never saved. Shown only in the browser, which alone knows. */
export function DraftOffer(props: DraftOfferProps) {
  const inBrowser = useSyncExternalStore(subscribeToNothing, () => true, () => false);
  return inBrowser ? <Offer {...props} /> : null;
}

const subscribeToNothing = () => () => undefined;

function Offer({ draftKey, revision, onRestore }: DraftOfferProps) {
  const [draft, setDraft] = useState(() => readDraft(localStorage, draftKey, Date.now()));
  if (!draft) return null;
  const when = new Date(draft.savedAt).toLocaleString("en-GB", { weekday: "long", hour: "2-digit", minute: "2-digit" });
  const putBack = () => {
    onRestore(draft);
    setDraft(null);
    document.getElementById("gear-name")?.focus();
  };
  const throwAway = () => {
    dropDraft(localStorage, draftKey);
    setDraft(null);
    document.getElementById("gear-name")?.focus();
  };
  return (
    <Notice title="You typed something here and did not save it" live>
      <p>
        It is from {when}, kept on this device.
        {draft.baseRevision === revision ? "" : " Somebody has saved this gear since; saving will show you both versions first."}
      </p>
      <div className="mt-3 flex flex-wrap gap-3">
        <Button tone="primary" onClick={putBack}>Put it back</Button>
        <Button onClick={throwAway}>Throw it away</Button>
      </div>
    </Notice>
  );
}
