import { Button } from "../ui/button";
import type { SaveState } from "./use-patch-editor";

interface SaveStatusProps {
  state: SaveState;
  revision: number;
  onRetry: () => void;
  /** Back to the question whose change stays. */
  onAsk: () => void;
}

/** Whether the patch on screen is on the server. */
export function SaveStatus({ state, revision, onRetry, onAsk }: SaveStatusProps) {
  if (state.status === "offline" || state.status === "refused") {
    return (
      <span role="alert" className="flex flex-wrap items-center gap-2 font-semibold text-verdict-hot">
        Not saved: {state.detail}
        <Button onClick={onRetry}>Try again</Button>
      </span>
    );
  }
  if (state.status === "asking") {
    return (
      <span role="status" className="flex flex-wrap items-center gap-2 font-semibold text-verdict-hot">
        Not saved: somebody else changed the same thing.
        <Button onClick={onAsk}>Choose whose stays</Button>
      </span>
    );
  }
  return (
    <span role="status" data-save={state.status} className="text-ink-soft">
      {state.status === "saved" ? (revision === 0 ? "Nothing to save yet" : `Saved · revision ${revision}`) : "Saving…"}
    </span>
  );
}
