import { formatQuantity, formatRange } from "@/lib/core/units/format-quantity";
import { toRange, type Range } from "@/lib/core/units/spread";
import type { LeadCheck } from "@/lib/core/electrics/patch-types";
import type { InputJack } from "@/lib/schemas/jack";
import { Table, Td, Th } from "../ui/table";

interface LevelPlotProps {
  check: LeadCheck;
  input: InputJack["input"] | undefined;
}

interface Band {
  name: string;
  range: Range;
  /** Filled bars are what arrives, outlined ones what the input asks for. */
  isFilled: boolean;
}

const WIDTH = 460;
const LEFT = 120;
const ROW = 26;

/** What arrives against what the input needs and stands, on one scale, and the same figures as a table. */
export function LevelPlot({ check, input }: LevelPlotProps) {
  const bands = bandsOf(check, input);
  if (bands.length === 0) return null;
  const low = Math.min(0, ...bands.map((band) => band.range.min));
  const high = Math.max(1, ...bands.map((band) => band.range.max));
  const pad = (high - low) * 0.04;
  const x = (volt: number) => LEFT + ((volt - low + pad) / (high - low + 2 * pad)) * (WIDTH - LEFT - 12);
  const ticks = ticksOf(low, high);
  const bottom = bands.length * ROW + 6;
  return (
    <figure className="flex flex-col gap-2">
      <svg viewBox={`0 0 ${WIDTH} ${bottom + 26}`} role="img" aria-label={bands.map((band) => `${band.name}: ${formatRange(band.range, "V")}`).join("; ")} className="w-full max-w-xl">
        {ticks.map((tick) => (
          <g key={tick}>
            <line x1={x(tick)} x2={x(tick)} y1="0" y2={bottom} className="stroke-line-soft" />
            <text x={x(tick)} y={bottom + 16} textAnchor="middle" className="fill-ink font-mono text-[12px]">{formatQuantity(tick, "V")}</text>
          </g>
        ))}
        {bands.map((band, index) => (
          <g key={band.name}>
            <text x={LEFT - 8} y={index * ROW + 19} textAnchor="end" className="fill-ink text-[13px]">{band.name}</text>
            <rect
              x={x(band.range.min)} y={index * ROW + 6} width={Math.max(3, x(band.range.max) - x(band.range.min))} height={ROW - 10}
              className={band.isFilled ? "fill-ink" : "fill-none stroke-ink"} strokeWidth={band.isFilled ? 0 : 1.5} strokeDasharray={band.isFilled ? undefined : "4 3"}
            />
          </g>
        ))}
      </svg>
      <figcaption className="sr-only">Filled bars arrive; dashed ones are what the input asks for or stands.</figcaption>
      <details>
        <summary className="py-1 text-sm underline">The same as a table</summary>
        <Table className="text-sm">
          <thead><tr><Th>Level</Th><Th>From</Th><Th>To</Th></tr></thead>
          <tbody>
            {bands.map((band) => (
              <tr key={band.name}><Td>{band.name}</Td><Td className="font-mono">{formatQuantity(band.range.min, "V")}</Td><Td className="font-mono">{formatQuantity(band.range.max, "V")}</Td></tr>
            ))}
          </tbody>
        </Table>
      </details>
    </figure>
  );
}

function bandsOf(check: LeadCheck, input: InputJack["input"] | undefined): Band[] {
  const bands: Band[] = [];
  if (check.highV) bands.push({ name: "When struck", range: check.highV, isFilled: true });
  if (check.lowV) bands.push({ name: "At rest", range: check.lowV, isFilled: true });
  if (bands.length === 0 || !input) return bands;
  if (input.onV !== null) bands.push({ name: "Fires within", range: toRange(input.onV), isFilled: false });
  if (input.offV !== null) bands.push({ name: "Lets go within", range: toRange(input.offV), isFilled: false });
  if (input.safeLowV !== null && input.safeHighV !== null) bands.push({ name: "Stands", range: { min: input.safeLowV, max: input.safeHighV }, isFilled: false });
  return bands;
}

/** Four to eight round steps. */
function ticksOf(low: number, high: number): number[] {
  const rough = (high - low) / 5;
  const power = 10 ** Math.floor(Math.log10(rough));
  const step = [1, 2, 5, 10].map((factor) => factor * power).find((candidate) => candidate >= rough) ?? power * 10;
  const ticks: number[] = [];
  for (let tick = Math.ceil(low / step) * step; tick <= high + step * 1e-6; tick += step) ticks.push(Math.abs(tick) < step * 1e-6 ? 0 : tick);
  return ticks;
}
