import { Sequelize } from "sequelize";
import { GearRow, initGear } from "./gear";
import { initJack, JackRow } from "./jack";
import { initMembership, Membership } from "./membership";
import { initPatchRevision, PatchRevision } from "./patch-revision";
import { initRig, Rig } from "./rig";
import { initSetEntry, SetEntry } from "./set-entry";
import { initSetList, SetListRow } from "./set-list";
import { initSong, SongRow } from "./song";
import { initUser, User } from "./user";
import { durableSqlite } from "./sqlite-driver";

/** Opens one SQLite file with every model and association; `storage` is a path. */
export function openDatabase(storage: string): Sequelize {
  const sequelize = new Sequelize({ dialect: "sqlite", dialectModule: durableSqlite, storage, logging: false });
  initUser(sequelize);
  initRig(sequelize);
  initMembership(sequelize);
  initGear(sequelize);
  initJack(sequelize);
  initSong(sequelize);
  initPatchRevision(sequelize);
  initSetList(sequelize);
  initSetEntry(sequelize);

  Membership.belongsTo(User, { as: "user", foreignKey: "userId" });
  GearRow.hasMany(JackRow, { as: "jacks", foreignKey: "gearId" });
  SetListRow.hasMany(SetEntry, { as: "entries", foreignKey: "setId" });
  return sequelize;
}

export { GearRow, JackRow, Membership, PatchRevision, Rig, SetEntry, SetListRow, SongRow, User };
