import { beforeAll, describe, expect, it } from "vitest";
import { database } from "@/lib/server/data/database";
import { sendTable } from "./support/library";
import { firstAdministrator, inCompany, type Person } from "./support/people";
import { request } from "./support/server";

let owner: Person & { companyId: string };
let installer: Person;

beforeAll(async () => {
  owner = await firstAdministrator();
  installer = await inCompany(owner, owner.companyId, ["installer"]);
});

const HEADINGS = ["Name", "Maker", "Model", "Used on", "Trip rating (A)", "Poles", "Interrupting rating (kA)", "Voltage rating (V)", "Mounting", "Lockable open", "Trip rating: datasheet", "Trip rating: page"];
const good = (n: number) => [`Tandem ${n}`, "Oddfellow", `OF-${n}`, "ac", String(15 + (n % 20) * 5), String(1 + (n % 3)), "22", "240", "plug-on", n % 2 ? "yes" : "no", `Sheet ${n}`, "4"];
/** Row as a spreadsheet numbers it, heading, what is written there, and words of the reason. */
const BAD: readonly (readonly [number, string, string, RegExp])[] = [
  [2, "Trip rating (A)", "15,5", /comma/], [17, "Trip rating (A)", "1,200", /comma/], [31, "Trip rating (A)", "60 A", /the number alone; the column is in A/],
  [44, "Trip rating (A)", "sixty", /must be a number/], [58, "Trip rating (A)", "0", /between 1 and 6000 A/], [73, "Trip rating (A)", "NaN", /must be a number/],
  [89, "Poles", "2.5", /whole number/], [102, "Poles", "5", /between 1 and 4/], [117, "Interrupting rating (kA)", "10.000,5", /comma/],
  [131, "Interrupting rating (kA)", "-22", /between 0.1 and 300 kA/], [144, "Voltage rating (V)", "120/240", /must be a number/], [144, "Mounting", "glued", /must be one of: bolt-on/],
  [160, "Used on", "dc", /must be one of: ac, battery dc, PV dc/], [175, "Lockable open", "maybe", /must be yes or no/], [188, "Maker", "m".repeat(61), /at most 60 characters/],
  [203, "Model", "two\nlines", /line break/], [219, "Name", "", /is missing/], [236, "Name", "tandem 1", /stands in row 3 already/],
  [252, "Trip rating: datasheet", "", /./], [301, "Voltage rating (V)", "1e9", /between 1 and 1500 V/],
];
const BAD_ROWS = new Set(BAD.map(([row]) => row));
const quoted = (cell: string) => (/[",;\n]/.test(cell) ? `"${cell.replaceAll("\"", "\"\"")}"` : cell);

/** 300 rows, of which 19 hold the 20 cells above. The row without a datasheet still names a page. */
function table(separator = ",", end = "\n"): string {
  const rows = Array.from({ length: 300 }, (_, index) => good(index));
  for (const [row, heading, cell] of BAD) rows[row - 2]![HEADINGS.indexOf(heading)] = cell;
  return [HEADINGS, ...rows].map((row) => row.map(quoted).join(separator)).join(end);
}
const names = async () => {
  const found = new Set<string>();
  for (let offset = 0; ; offset += 200) {
    const { body } = await request("GET", `/api/companies/${owner.companyId}/library?kind=breaker&q=tandem&limit=200&offset=${offset}`, { as: owner });
    for (const each of body.entries) found.add(each.name);
    if (offset + 200 >= body.total) return found;
  }
};
const counts = async () => Promise.all([database().LibraryEntry.count(), database().LibraryVersion.count(), database().AuditEntry.count({ where: { action: "library.import" } })]);

describe("a table of 300 entries with 20 bad cells", () => {
  let digest = "";

  it("names each bad cell by row and column, and writes nothing", async () => {
    const before = await counts();
    const { status, body } = await sendTable(owner, owner.companyId, "breaker", table());
    expect(status).toBe(200);
    expect(body).toMatchObject({ kind: "breaker", total: 300, unknownColumns: [] });
    // The missing datasheet is seen at the page that stands alone.
    const wanted = BAD.map(([row, column, value, reason]) => (column === "Trip rating: datasheet" ? [row, "Trip rating: page", "4", /page without a datasheet/] : [row, column, value, reason]));
    expect(body.faults).toHaveLength(20);
    for (const [row, column, value, reason] of wanted) {
      expect(body.faults).toContainEqual({ row, column, value, reason: expect.stringMatching(reason as RegExp) });
    }
    expect(body.good).toHaveLength(281);
    expect(body.good.every((each: { action: string }) => each.action === "add")).toBe(true);
    expect(body.good.filter((each: { row: number }) => BAD_ROWS.has(each.row))).toEqual([]);
    expect(await counts()).toEqual(before);
    ({ digest } = body);
  });

  it("is not taken in with the digest of another table, or by somebody who may not", async () => {
    const before = await counts();
    const other = await sendTable(owner, owner.companyId, "breaker", table().replace("OF-5,", "OF-5x,"), digest);
    expect(other).toMatchObject({ status: 409, body: { code: "import-changed" } });
    expect(await sendTable(installer, owner.companyId, "breaker", table(), digest)).toMatchObject({ status: 403 });
    expect(await sendTable(installer, owner.companyId, "breaker", table())).toMatchObject({ status: 403 });
    expect(await counts()).toEqual(before);
  });

  it("is taken in on confirmation: exactly the good rows, in one go", async () => {
    const [entries, versions, audits] = await counts();
    expect(await sendTable(owner, owner.companyId, "breaker", table(), digest)).toMatchObject({ status: 200, body: { added: 281, changed: 0, same: 0 } });
    expect(await counts()).toEqual([entries! + 281, versions! + 281, audits! + 1]);
    const wanted = Array.from({ length: 300 }, (_, index) => index).filter((index) => !BAD_ROWS.has(index + 2)).map((index) => `Tandem ${index}`);
    expect([...await names()].sort()).toEqual(wanted.sort());
    const found = await request("GET", `/api/companies/${owner.companyId}/library?q=Tandem 7 OF-7`, { as: owner });
    const line = found.body.entries.find((each: { name: string }) => each.name === "Tandem 7");
    expect(line).toMatchObject({ make: "Oddfellow", model: "OF-7", version: 1, starter: false, rated: 4, sourced: 1 });
    const entry = await request("GET", `/api/library/${line.id}`, { as: owner });
    expect(entry.body.data).toMatchObject({
      props: { make: "Oddfellow", ratingA: 50, poles: 2, interruptingKA: 22, lockable: true, mount: "plug-on", trip: null }, sources: { ratingA: { document: "Sheet 7", page: "4" } },
    });
    expect(entry.body.versions).toEqual([{ version: 1, by: owner.name, at: expect.any(String), note: "From a table" }]);
  });

  it("cannot be confirmed twice, and changes nothing when taken in again", async () => {
    expect(await sendTable(owner, owner.companyId, "breaker", table(), digest)).toMatchObject({ status: 409, body: { code: "import-changed" } });
    const again = await sendTable(owner, owner.companyId, "breaker", table());
    expect(again.body.good.filter((each: { action: string }) => each.action !== "same")).toEqual([]);
    const [, versions] = await counts();
    expect((await sendTable(owner, owner.companyId, "breaker", table(), again.body.digest)).body).toEqual({ added: 0, changed: 0, same: 281 });
    expect((await counts())[1]).toBe(versions);
  });
});

describe("a table that changes entries", () => {
  it("makes a version of what differs, keeps columns that are left out, and empties what is emptied", async () => {
    const text = "\ufeffname;ratingA;Voltage rating (V);Color\r\nTandem 3;35;;red\r\n\r\nTandem 4;35;240;red\r\n";
    const preview = await sendTable(owner, owner.companyId, "breaker", text);
    expect(preview.body).toMatchObject({ total: 2, faults: [], unknownColumns: ["Color"] });
    expect(preview.body.good.map((each: { row: number; action: string }) => [each.row, each.action])).toEqual([[2, "new version"], [4, "same"]]);
    expect((await sendTable(owner, owner.companyId, "breaker", text, preview.body.digest)).body).toEqual({ added: 0, changed: 1, same: 1 });
    const entry = await request("GET", `/api/library/${preview.body.good[0].entryId}`, { as: owner });
    expect(entry.body).toMatchObject({ version: 2, data: { props: { make: "Oddfellow", ratingA: 35, poles: 1, voltageV: null } } });
    expect((await request("GET", `/api/library/${entry.body.id}/versions/1`, { as: owner })).body.data.props).toMatchObject({ ratingA: 30, voltageV: 240 });
  });

  it("is refused when the library was changed after the preview", async () => {
    const text = "Name,Trip rating (A)\nTandem 9,100\n";
    const preview = await sendTable(owner, owner.companyId, "breaker", text);
    const { entryId } = preview.body.good[0];
    const { data } = (await request("GET", `/api/library/${entryId}`, { as: owner })).body;
    expect((await request("PATCH", `/api/library/${entryId}`, { as: owner, body: { baseVersion: 1, data: { ...data, props: { ...data.props, ratingA: 90 } } } })).status).toBe(200);
    expect(await sendTable(owner, owner.companyId, "breaker", text, preview.body.digest)).toMatchObject({ status: 409, body: { code: "import-changed" } });
    expect((await request("GET", `/api/library/${entryId}`, { as: owner })).body.data.props.ratingA).toBe(90);
  });

  it("does not wake an archived entry", async () => {
    const text = "Name,Poles\nTandem 11,1\n";
    const { entryId } = (await sendTable(owner, owner.companyId, "breaker", text)).body.good[0];
    await request("PATCH", `/api/library/${entryId}`, { as: owner, body: { baseVersion: 1, archived: true } });
    expect((await sendTable(owner, owner.companyId, "breaker", text)).body).toMatchObject({
      good: [], faults: [{ row: 2, column: "Name", value: "Tandem 11", reason: expect.stringContaining("archived") }],
    });
  });
});

describe("a file that is no table of the kind", () => {
  it.each([
    ["empty", "", /is empty/],
    ["a workbook", Buffer.from("504b030414000600", "hex"), /Save the sheet as CSV/],
    ["UTF-16", Buffer.from("\ufeffName,Poles\nA,1", "utf16le"), /UTF-16/],
    ["another encoding", Buffer.from("Name,Maker\nA,Caf\xe9\n", "latin1"), /not UTF-8/],
    ["without names", "Maker,Poles\nA,1\n", /no column Name/],
    ["with a column twice", "Name,Poles,poles\nA,1,2\n", /twice/],
    ["with a quotation mark that stays open", "Name,Maker\nA,\"B\nC,D\n", /quotation mark.*line/],
    ["of too many rows", `Name\n${Array.from({ length: 2001 }, (_, index) => `E ${index}`).join("\n")}`, /2001 rows/],
  ])("%s is refused in words", async (_, text, words) => {
    expect(await sendTable(owner, owner.companyId, "breaker", text)).toMatchObject({ status: 422, body: { code: "table", detail: expect.stringMatching(words) } });
  });

  it("is refused by kind, type and size", async () => {
    expect(await sendTable(owner, owner.companyId, "toaster", "Name\nA\n")).toMatchObject({ status: 422, body: { field: "kind" } });
    expect((await request("POST", `/api/companies/${owner.companyId}/library/import?kind=breaker`, { as: owner, raw: "Name\nA\n", headers: { "content-type": "text/plain" } })).status).toBe(415);
    expect((await sendTable(owner, owner.companyId, "breaker", Buffer.alloc(5 * 1024 * 1024 + 1, "a"))).status).toBe(413);
  });
});

describe("the table of a library", () => {
  it("is harmless in a spreadsheet, and taken in again it changes nothing", async () => {
    const name = "=HYPERLINK(\"http://elsewhere.example\";\"x\")";
    const props = { make: "@sum", model: "-1+2", openCircuitPercentPerC: -0.26, modules: 12 };
    const data = { props, sources: { openCircuitPercentPerC: { document: "+sheet, \"new\"", page: "2" } }, ports: {} };
    expect((await request("POST", `/api/companies/${owner.companyId}/library`, { as: owner, body: { kind: "pv-string", name, data } })).status).toBe(201);
    const file = await request("GET", `/api/companies/${owner.companyId}/library/template.csv?kind=pv-string&fill=yes`, { as: installer });
    expect(file.headers.get("content-disposition")).toBe("attachment; filename=\"library-pv-string.csv\"");
    const text = file.bytes.toString("utf8");
    expect(text.startsWith("\ufeffName,Maker,Model,")).toBe(true);
    // No cell begins like a formula; a negative number is a number.
    expect(text).toContain("\"'=HYPERLINK(\"\"http://elsewhere.example\"\";\"\"x\"\")\",'@sum,'-1+2,");
    expect(text).toContain(",-0.26,\"'+sheet, \"\"new\"\"\",2,");
    expect(text).not.toMatch(/(^|[,\n]"?)[=@+]/);
    const back = await sendTable(owner, owner.companyId, "pv-string", file.bytes);
    expect(back.body.faults).toEqual([]);
    expect(back.body.good.map((each: { action: string }) => each.action)).toEqual(["same", "same", "same"]);
  });

  it("without entries is the headings alone", async () => {
    const { bytes } = await request("GET", `/api/companies/${owner.companyId}/library/template.csv?kind=electrode`, { as: owner });
    expect(bytes.toString("utf8")).toBe("\ufeffName,Electrode,Rod spacing (ft),Rod length (ft)\r\n");
  });
});
