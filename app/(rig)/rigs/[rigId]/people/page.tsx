import type { Metadata } from "next";
import { PageHeader } from "@/components/ui/page-header";
import { Table, Td, Th } from "@/components/ui/table";
import { requireActor } from "@/lib/auth/require-actor";
import { listMembers } from "@/lib/data/list-members";
import { orNotFound } from "@/lib/http/or-not-found";
import { paths } from "@/lib/paths";
import { holds, type Right } from "@/lib/rights/can";
import { ROLES } from "@/lib/schemas/rig";

export const metadata: Metadata = { title: "People" };

const ROLE_WORDS = { performer: "Performer (owner)", collaborator: "Collaborator", "sound-helper": "Sound helper" } as const;
const MAY: ReadonlyArray<readonly [right: Right, text: string]> = [
  ["seeRig", "See gear, songs, sets and verdicts"],
  ["print", "Print patch sheets"],
  ["editDesk", "Edit desk channels"],
  ["editGear", "Edit gear and jacks"],
  ["editPatch", "Edit patches and knobs"],
  ["editSongs", "Add, rename and delete songs"],
  ["editSets", "Order set lists"],
  ["manageRig", "Rename the rig"],
];

export default async function PeoplePage({ params }: { params: Promise<{ rigId: string }> }) {
  const { rigId } = await params;
  const actor = await requireActor(paths.people(rigId));
  const members = await orNotFound(listMembers(actor, rigId));
  return (
    <div className="mx-auto max-w-4xl">
      <PageHeader title="People">Who is in this rig, and what each of them may do.</PageHeader>
      <div className="mb-10 overflow-x-auto">
        <Table>
          <thead><tr><Th>Name</Th><Th>E-mail</Th><Th>Role</Th></tr></thead>
          <tbody>
            {members.map((member) => (
              <tr key={member.userId}>
                <Td className="font-semibold">{member.name}{member.userId === actor.userId ? " (you)" : ""}</Td>
                <Td className="break-all">{member.email}</Td>
                <Td>{ROLE_WORDS[member.role]}</Td>
              </tr>
            ))}
          </tbody>
        </Table>
      </div>
      <h2 className="mb-2 text-xl font-bold">What each role may do</h2>
      <div className="overflow-x-auto" tabIndex={0} role="region" aria-label="What each role may do">
        <Table>
          <thead><tr><Th>May</Th>{ROLES.map((role) => <Th key={role}>{ROLE_WORDS[role]}</Th>)}</tr></thead>
          <tbody>
            {MAY.map(([right, text]) => (
              <tr key={right}>
                <Td>{text}</Td>
                {ROLES.map((role) => <Td key={role}>{holds(role, right) ? "yes" : "no"}</Td>)}
              </tr>
            ))}
          </tbody>
        </Table>
      </div>
    </div>
  );
}
