import { Button } from "../ui/button";
import { Notice } from "../ui/notice";
import type { Gone } from "./find-gone";

/** What this song still names though its gear lost it, and the one way on. */
export function GoneNotice({ gone, onClear }: { gone: Gone; onClear?: () => void }) {
  return (
    <Notice tone="caution" title="Something in this song is gone from its box" className="mb-3">
      <p className="mb-2">
        {gone.leadNumbers.length > 0 ? `Lead ${gone.leadNumbers.join(", ")} ended at a jack that the gear no longer has. ` : ""}
        {gone.knobs > 0 ? "A knob that was set here is no longer on its box. " : ""}
        Until it is cleared, changes to this song cannot be saved.
      </p>
      {onClear ? <Button onClick={onClear}>Clear what is gone</Button> : null}
    </Notice>
  );
}
