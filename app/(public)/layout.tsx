import Link from "next/link";
import type { ReactNode } from "react";
import { SiteFooter } from "@/components/ui/site-footer";
import { SiteHeader } from "@/components/ui/site-header";
import { currentUser } from "@/lib/auth/current-user";
import { paths } from "@/lib/paths";

export default async function PublicLayout({ children }: { children: ReactNode }) {
  const user = await currentUser();
  return (
    <>
      <SiteHeader name="Knockwire" homeHref={paths.home()}>
        <nav aria-label="Site" className="flex gap-4 font-semibold">
          {user ? (
            <Link className="inline-flex min-h-11 items-center md:min-h-9" href={paths.rigs()}>Your rigs</Link>
          ) : (
            <>
              <Link className="inline-flex min-h-11 items-center md:min-h-9" href={paths.signIn()}>Sign in</Link>
              <Link className="inline-flex min-h-11 items-center md:min-h-9" href={paths.signUp()}>Sign up</Link>
            </>
          )}
        </nav>
      </SiteHeader>
      <main id="main" className="mx-auto w-full max-w-5xl px-4 py-8 md:px-6">{children}</main>
      <SiteFooter>Low-voltage DC only. A verdict is as good as the figures typed in: measure before the gig.</SiteFooter>
    </>
  );
}
