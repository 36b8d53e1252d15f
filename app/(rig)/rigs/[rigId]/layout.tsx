import type { ReactNode } from "react";
import { NavLink } from "@/components/ui/nav-link";
import { Tape } from "@/components/ui/tape";
import { currentUser } from "@/lib/auth/current-user";
import { listSets } from "@/lib/data/list-sets";
import { loadRig } from "@/lib/data/load-rig";
import { orNotFound } from "@/lib/http/or-not-found";
import { paths } from "@/lib/paths";

interface Props {
  children: ReactNode;
  params: Promise<{ rigId: string }>;
}

export default async function RigLayout({ children, params }: Props) {
  const { rigId } = await params;
  const actor = await currentUser();
  // The page sends a visitor to sign in, since it alone knows where to come back to.
  if (!actor) return children;
  const [{ rig }, sets] = await orNotFound(Promise.all([loadRig(actor, rigId), listSets(actor, rigId)]));
  const firstSet = sets[0];
  return (
    <>
      <div data-print="hide" className="flex flex-wrap items-center gap-x-6 gap-y-1 border-b border-line bg-bench px-4 py-1 md:px-6">
        <nav aria-label="Rig" className="flex flex-wrap items-center gap-x-1">
          <Tape size="small" className="mr-4 max-w-[60vw] truncate">{rig.name}</Tape>
          <NavLink href={paths.rig(rigId)} exact>Overview</NavLink>
          <NavLink href={paths.gearList(rigId)}>Gear</NavLink>
          <NavLink href={paths.songs(rigId)}>Songs</NavLink>
          {firstSet ? <NavLink href={paths.set(rigId, firstSet.id)}>Set list</NavLink> : null}
          <NavLink href={paths.people(rigId)}>People</NavLink>
        </nav>
      </div>
      <main id="main" className="w-full px-4 py-6 md:px-6">{children}</main>
    </>
  );
}
