import type { QueryInterface, Sequelize } from "sequelize";
import { SequelizeStorage, Umzug } from "umzug";
import * as peopleAndRigs from "./001-people-and-rigs";
import * as gearAndJacks from "./002-gear-and-jacks";
import * as songsAndPatches from "./003-songs-and-patches";
import * as setLists from "./004-set-lists";

interface Migration {
  up(query: QueryInterface): Promise<void>;
  down(query: QueryInterface): Promise<void>;
}

/** Every migration in order. New ones are added at the end and never changed once landed. */
const MIGRATIONS: ReadonlyArray<readonly [name: string, migration: Migration]> = [
  ["001-people-and-rigs", peopleAndRigs],
  ["002-gear-and-jacks", gearAndJacks],
  ["003-songs-and-patches", songsAndPatches],
  ["004-set-lists", setLists],
];

export function migrator(sequelize: Sequelize) {
  const query = sequelize.getQueryInterface();
  return new Umzug({
    migrations: MIGRATIONS.map(([name, migration]) => ({
      name,
      up: () => migration.up(query),
      down: () => migration.down(query),
    })),
    context: query,
    storage: new SequelizeStorage({ sequelize }),
    logger: undefined,
  });
}
