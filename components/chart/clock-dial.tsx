import { clockDegrees, clockText } from "@/lib/core/chart";

interface ClockDialProps {
  /** 0…1. */
  position: number;
  size?: number;
  className?: string;
}

/** A knob's position as a small dial. The hand is drawn; the words are for whoever cannot see it. */
export function ClockDial({ position, size = 22, className }: ClockDialProps) {
  const angle = (clockDegrees(position) * Math.PI) / 180;
  const at = (radius: number, radians: number) => ({ x: 12 + radius * Math.sin(radians), y: 12 - radius * Math.cos(radians) });
  const [hand, first, last] = [at(8, angle), at(10, (-150 * Math.PI) / 180), at(10, (150 * Math.PI) / 180)];
  const fixed = (value: number) => value.toFixed(2);
  return (
    <svg width={size} height={size} viewBox="0 0 24 24" role="img" aria-label={clockText(position)} className={className}>
      <path d={`M${fixed(first.x)} ${fixed(first.y)} A10 10 0 1 1 ${fixed(last.x)} ${fixed(last.y)}`} fill="none" stroke="currentColor" strokeWidth="1.5" />
      <line x1="12" y1="12" x2={fixed(hand.x)} y2={fixed(hand.y)} stroke="currentColor" strokeWidth="2.5" strokeLinecap="round" />
    </svg>
  );
}
