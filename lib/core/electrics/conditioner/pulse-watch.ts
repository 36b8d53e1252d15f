import type { Pulse } from "./conditioner-types";
import type { Stretch } from "./wanted-levels";

/** Collects the trigger output's crossings of its half level. */
export class PulseWatch {
  readonly pulses: Pulse[] = [];
  private sinceS: number | null = null;

  constructor(private above: boolean) {}

  see(timeS: number, above: boolean): void {
    if (above === this.above) return;
    this.above = above;
    if (above) this.sinceS = timeS;
    else if (this.sinceS !== null) {
      if (timeS > this.sinceS) this.pulses.push({ startS: this.sinceS, widthS: timeS - this.sinceS });
      this.sinceS = null;
    }
  }

  /** A pulse that never ended is cut where the simulation stops. */
  close(timeS: number): Pulse[] {
    if (this.sinceS !== null && timeS > this.sinceS) this.pulses.push({ startS: this.sinceS, widthS: timeS - this.sinceS });
    return this.pulses;
  }
}

/** When a stretch's wanted level meets `volt`, s; null where it does not. */
export function meets({ fromS, untilS, volt, rate }: Stretch, level: number): number | null {
  if (rate === 0) return null;
  const timeS = fromS + (level - volt) / rate;
  return timeS > fromS && timeS <= untilS ? timeS : null;
}
