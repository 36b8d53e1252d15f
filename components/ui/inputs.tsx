import clsx from "clsx";
import type { ComponentProps } from "react";

const BOX = "w-full min-h-11 rounded-sm border-2 border-line bg-raised px-2.5 py-1.5 text-base text-ink placeholder:text-ink-soft aria-invalid:border-verdict-hot disabled:opacity-70 md:min-h-9";

export function TextInput({ className, ...rest }: ComponentProps<"input">) {
  return <input className={clsx(BOX, className)} {...rest} />;
}

export function TextArea({ className, rows = 3, ...rest }: ComponentProps<"textarea">) {
  return <textarea rows={rows} className={clsx(BOX, className)} {...rest} />;
}

export function Select({ className, ...rest }: ComponentProps<"select">) {
  return <select className={clsx(BOX, "pr-8", className)} {...rest} />;
}

interface CheckboxProps extends Omit<ComponentProps<"input">, "type"> {
  label: React.ReactNode;
}

export function Checkbox({ label, className, ...rest }: CheckboxProps) {
  return (
    <label className={clsx("inline-flex min-h-8 items-center gap-2", className)}>
      <input type="checkbox" className="size-5 accent-ink" {...rest} />
      <span>{label}</span>
    </label>
  );
}
