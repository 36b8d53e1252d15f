import clsx from "clsx";
import type { ComponentProps } from "react";

export function Table({ className, ...rest }: ComponentProps<"table">) {
  return <table className={clsx("w-full border-collapse text-left", className)} {...rest} />;
}

export function Th({ className, scope = "col", ...rest }: ComponentProps<"th">) {
  return <th scope={scope} className={clsx("border-b-2 border-ink px-2 py-2 align-bottom text-sm font-bold", className)} {...rest} />;
}

export function Td({ className, ...rest }: ComponentProps<"td">) {
  return <td className={clsx("border-b border-line-soft px-2 py-2 align-top", className)} {...rest} />;
}
