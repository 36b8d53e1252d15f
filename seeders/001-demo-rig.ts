import type { Sequelize, Transaction } from "sequelize";
import { DEMO_PASSWORD } from "@/lib/auth/demo-accounts";
import { hashPassword } from "@/lib/auth/password";
import { gearInputSchema } from "@/lib/schemas/gear";
import { GearRow, JackRow, Membership, PatchRevision, Rig, SetEntry, SetListRow, SongRow, User } from "@/models";
import { demoGear } from "./demo/gear";
import { demoPatch } from "./demo/demo-patch";
import { demoSongs } from "./demo/songs";

const RIG_ID = "marrow-lane";
const SEEDED_AT = new Date("2026-01-15T19:30:00Z");

const PEOPLE = [
  { id: "demo-performer", email: "performer@marrowlane.example", name: "Performer", role: "performer" },
  { id: "demo-collaborator", email: "collaborator@marrowlane.example", name: "Collaborator", role: "collaborator" },
  { id: "demo-sound", email: "sound@marrowlane.example", name: "Sound helper", role: "sound-helper" },
] as const;

/** Puts the demo rig into an empty database; does nothing where it is already. */
export async function up(sequelize: Sequelize): Promise<boolean> {
  if (await Rig.findByPk(RIG_ID)) return false;
  const passwordHash = await hashPassword(DEMO_PASSWORD);
  await sequelize.transaction(async (transaction) => {
    await Rig.create({ id: RIG_ID, name: "Marrow Lane", createdAt: SEEDED_AT }, { transaction });
    for (const { id, email, name, role } of PEOPLE) {
      await User.create({ id, email, name, passwordHash, createdAt: SEEDED_AT }, { transaction });
      await Membership.create({ rigId: RIG_ID, userId: id, role }, { transaction });
    }
    await seedGear(transaction);
    await seedSongs(transaction);
  });
  return true;
}

/** Takes the demo rig and its people out again. */
export async function down(sequelize: Sequelize): Promise<void> {
  await sequelize.transaction(async (transaction) => {
    await Rig.destroy({ where: { id: RIG_ID }, transaction });
    await User.destroy({ where: { id: PEOPLE.map((person) => person.id) }, transaction });
  });
}

async function seedGear(transaction: Transaction): Promise<void> {
  for (const [position, { id, gear: draft }] of demoGear.entries()) {
    const gear = gearInputSchema.parse(draft);
    await GearRow.create(
      {
        id, rigId: RIG_ID, kind: gear.details.kind, name: gear.name, notes: gear.notes, supplyId: gear.supplyId,
        details: gear.details, knobs: gear.knobs, assumed: gear.assumed, position,
      },
      { transaction },
    );
    await JackRow.bulkCreate(
      gear.jacks.map((jack, order) => ({
        id: jack.id, gearId: id, direction: jack.direction, name: jack.name, connector: jack.connector, role: jack.role, position: order,
        figures: jack.direction === "output" ? jack.output : jack.input,
      })),
      { transaction },
    );
  }
}

async function seedSongs(transaction: Transaction): Promise<void> {
  await SetListRow.create({ id: "pump-house", rigId: RIG_ID, name: "Pump House, Thursday", position: 0 }, { transaction });
  for (const [position, song] of demoSongs.entries()) {
    const { id, title, tempoBpm, notes } = song;
    await SongRow.create({ id, rigId: RIG_ID, title, tempoBpm, notes, position, revision: 1 }, { transaction });
    await PatchRevision.create({ songId: id, revision: 1, authorId: "demo-performer", savedAt: SEEDED_AT, patch: demoPatch(song) }, { transaction });
    await SetEntry.create({ setId: "pump-house", songId: id, position }, { transaction });
  }
}
