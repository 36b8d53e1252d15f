import type { Metadata } from "next";
import { SiteHeader } from "@/components/ui/site-header";
import { paths } from "@/lib/paths";
import { NothingHere } from "./_components/nothing-here";

export const metadata: Metadata = { title: "Nothing here" };

export default function NotFound() {
  return (
    <>
      <SiteHeader name="Knockwire" homeHref={paths.home()} />
      <NothingHere />
    </>
  );
}
