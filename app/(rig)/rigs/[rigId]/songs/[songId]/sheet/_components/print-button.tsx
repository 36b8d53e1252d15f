"use client";
import { Button } from "@/components/ui/button";

/** Prints this page; the print stylesheet leaves the sheet alone on it. */
export function PrintButton() {
  return <Button onClick={() => window.print()}>Print this page</Button>;
}
