import type { ReactNode } from "react";
import { NavLink } from "@/components/ui/nav-link";
import { SiteFooter } from "@/components/ui/site-footer";
import { SiteHeader } from "@/components/ui/site-header";
import { currentUser } from "@/lib/auth/current-user";
import { paths } from "@/lib/paths";

export default async function SignedInLayout({ children }: { children: ReactNode }) {
  const actor = await currentUser();
  // Nobody signed in: the page itself knows its address and sends them to sign in and back.
  if (!actor) return children;
  return (
    <>
      <SiteHeader name="Knockwire" homeHref={paths.rigs()}>
        <nav aria-label="You" className="flex gap-2">
          <NavLink href={paths.rigs()} exact>Rigs</NavLink>
          <NavLink href={paths.account()}>{actor.name}</NavLink>
        </nav>
      </SiteHeader>
      {children}
      <SiteFooter>Low-voltage DC only. A verdict is as good as the figures typed in: measure before the gig.</SiteFooter>
    </>
  );
}
