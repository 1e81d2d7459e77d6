import { QueryTypes } from "sequelize";
import { describe, expect, it } from "vitest";
import { database } from "@/lib/server/data/database";
import { down, up } from "@/migrations/0007-jurisdictions";

const adoption = (edition: string, effectiveFrom: string | null) => ({ edition, effectiveFrom, effectiveTo: null });

describe("the jurisdictions' migration", () => {
  it("leads back to one edition, the one in force, and forward again with nothing lost that was there before", async () => {
    const { sequelize } = database();
    const context = sequelize.getQueryInterface();
    const rows = (columns: string) => sequelize.query(`select ${columns} from jurisdictions order by name`, { type: QueryTypes.SELECT });
    for (const [name, editions] of Object.entries({
      A: [adoption("2020", null), adoption("2023", "2025-01-01"), adoption("2026", "2999-01-01")], B: [adoption("2017", null)],
    })) await sequelize.query("insert into jurisdictions (name, editions, amendments) values (:name, :editions, '{}')", { replacements: { name, editions: JSON.stringify(editions) } });
    await down({ context });
    expect(await rows("name, edition")).toEqual([{ name: "A", edition: "2023" }, { name: "B", edition: "2017" }]);
    await expect(rows("editions")).rejects.toThrow("does not exist");
    await up({ context });
    expect(await rows("name, editions, version, signs")).toEqual([
      { name: "A", editions: [adoption("2023", null)], version: 1, signs: "licensed professional" }, { name: "B", editions: [adoption("2017", null)], version: 1, signs: "licensed professional" },
    ]);
  });
});
