import { afterEach, describe, expect, it } from "vitest";
import { mkdtempSync, rmSync } from "node:fs";
import { tmpdir } from "node:os";
import { join } from "node:path";
import { QueryTypes, type Sequelize } from "sequelize";
import { migrator } from "@/migrations/migrator";
import { openDatabase } from "@/models";
import { down as unseed, up as seed } from "@/seeders/001-demo-rig";

let folder: string | undefined;
let sequelize: Sequelize | undefined;

function open(): Sequelize {
  folder = mkdtempSync(join(tmpdir(), "knockwire-migrate-"));
  sequelize = openDatabase(join(folder, "test.sqlite"));
  return sequelize;
}

function rows(query: string): Promise<Record<string, unknown>[]> {
  return (sequelize as Sequelize).query<Record<string, unknown>>(query, { type: QueryTypes.SELECT });
}

afterEach(async () => {
  await sequelize?.close();
  if (folder) rmSync(folder, { recursive: true, force: true });
});

describe("migrations", () => {
  it("go up, all the way down, and up again to the same schema", async () => {
    const umzug = migrator(open());
    await umzug.up();
    const schema = "SELECT name, sql FROM sqlite_master WHERE name NOT LIKE 'sqlite_%' AND name <> 'SequelizeMeta' ORDER BY name";
    const first = await rows(schema);
    expect(first.length).toBeGreaterThan(8);
    await umzug.down({ to: 0 });
    expect(await rows(schema)).toEqual([]);
    await umzug.up();
    expect(await rows(schema)).toEqual(first);
  });

  it("agree with the models column by column", async () => {
    const db = open();
    await migrator(db).up();
    for (const model of Object.values(db.models)) {
      const columns = Object.keys(await db.getQueryInterface().describeTable(model.getTableName() as string));
      const wanted = Object.values(model.getAttributes()).map((attribute) => attribute.field);
      expect(columns.sort(), model.name).toEqual(wanted.sort());
    }
  });
});

describe("the demo seeder", () => {
  it("may run twice, gives the same rows each time, and can be taken out", async () => {
    const db = open();
    await migrator(db).up();
    expect(await seed(db)).toBe(true);
    expect(await seed(db)).toBe(false);
    const counts = await rows("SELECT kind, COUNT(*) AS n FROM gear GROUP BY kind ORDER BY kind");
    expect(Object.fromEntries(counts.map((row) => [row.kind, row.n]))).toEqual({ conditioner: 6, "desk-channel": 8, pad: 8, shaper: 2, supply: 4, voice: 9 });
    const before = await rows("SELECT * FROM patch_revisions ORDER BY song_id");
    await unseed(db);
    expect(await rows("SELECT * FROM gear")).toEqual([]);
    await seed(db);
    expect(await rows("SELECT * FROM patch_revisions ORDER BY song_id")).toEqual(before);
  });
});

describe("a new connection", () => {
  it("waits for locks, keeps foreign keys, and reaches the disk before it answers", async () => {
    open();
    expect((await rows("PRAGMA foreign_keys"))[0]).toEqual({ foreign_keys: 1 });
    expect((await rows("PRAGMA busy_timeout"))[0]).toEqual({ timeout: 5000 });
    expect((await rows("PRAGMA synchronous"))[0]).toEqual({ synchronous: 2 });
  });
});
