import { describe, expect, it } from "vitest";
import {
  documentName, emptyDraft, firstPage, kept, mergeDrafts, sameDraft, sourceForAll, sourceWithFile, unsourced, versionDifferences, withPort, withProperty, withSource, withTheirs, type EntryDraft,
} from "@/components/library/entryDraft";
import { kindDefinition } from "@/lib/equipment/registry";
import { STARTER_SOURCE } from "@/lib/equipment/starter";

const breaker = kindDefinition("breaker");
const inverter = kindDefinition("string-inverter");
const SHEET = { document: "Sheet", page: "3" };
const begun = (): EntryDraft => withSource(withProperty(withProperty({ ...emptyDraft("breaker"), name: "Main" }, "ratingA", 60), "poles", 2), "ratingA", SHEET);

describe("an entry that is being typed", () => {
  it("starts with nothing known, whatever its kind mostly is", () => {
    const { data } = emptyDraft("breaker");
    expect(Object.keys(data.props)).toEqual(Object.keys(breaker.properties));
    expect(Object.values(data.props).every((value) => value === null)).toBe(true);
  });

  it("is the same whatever the order of its members, and another one with another value", () => {
    const draft = begun();
    const turned = { ...draft, data: { ...draft.data, props: Object.fromEntries(Object.entries(draft.data.props).reverse()), sources: { ratingA: { page: "3", document: "Sheet" } } } };
    expect(sameDraft(draft, turned)).toBe(true);
    expect(sameDraft(draft, withProperty(draft, "poles", 1))).toBe(false);
    expect(sameDraft(draft, { ...draft, name: "Other" })).toBe(false);
  });

  it("drops a source that says nothing any more", () => {
    expect(withSource(begun(), "ratingA", { document: "", page: "" }).data.sources).toEqual({});
  });

  it("takes an invented value's source away with the value, and no other one", () => {
    const invented = withSource(begun(), "poles", { ...STARTER_SOURCE });
    expect(withProperty(invented, "poles", 2).data.sources["poles"]).toEqual(STARTER_SOURCE);
    const typed = withProperty(withProperty(invented, "poles", 3), "ratingA", 70);
    expect(typed.data.sources).toEqual({ ratingA: SHEET });
  });

  it("keeps no source of a value that is not known, and no port that its properties do not give", () => {
    const three = withPort(withProperty(emptyDraft("string-inverter"), "trackers", 3), "pv3", { maximumV: 600 });
    expect(kept(inverter, three.data).ports).toEqual({ pv3: { maximumV: 600 } });
    expect(kept(inverter, withProperty(three, "trackers", 2).data).ports).toEqual({});
    expect(kept(breaker, withProperty(begun(), "ratingA", null).data).sources).toEqual({});
  });
});

describe("where a value was read", () => {
  it("is missing for rated values alone, and one document can be named for all of them without touching the others", () => {
    const draft = withProperty(begun(), "mount", "bolt-on");
    expect(unsourced(breaker, draft.data)).toEqual(["poles"]);
    const named = sourceForAll(breaker, draft, "Catalog", "a5c1f2ce-6c5f-4a0e-9f6e-0d6f3b1b2c11");
    expect(named.data.sources).toEqual({ ratingA: SHEET, poles: { document: "Catalog", page: "", file: "a5c1f2ce-6c5f-4a0e-9f6e-0d6f3b1b2c11" } });
    expect(unsourced(breaker, named.data)).toEqual([]);
  });

  it("takes the name of a stored file where none is typed, or where it was another file's", () => {
    const file = { id: "f", name: "OX-60.PDF" };
    expect(documentName(file.name)).toBe("OX-60");
    expect(sourceWithFile(undefined, file, [file.name])).toEqual({ document: "OX-60", page: "", file: "f" });
    expect(sourceWithFile({ document: "Old", page: "2", file: "o" }, file, ["Old.pdf", file.name])).toEqual({ document: "OX-60", page: "2", file: "f" });
    expect(sourceWithFile({ document: "Marking on the unit", page: "" }, file, [file.name])).toEqual({ document: "Marking on the unit", page: "", file: "f" });
    expect(sourceWithFile({ document: "OX-60", page: "2", file: "f" }, null, [file.name])).toEqual({ document: "OX-60", page: "2" });
  });

  it.each([["3", 3], ["p. 14", 14], ["12-13", 12], ["table 4, page 9", 4], ["0", null], ["cover", null], ["", null]])("page %j opens at %j", (page, expected) => {
    expect(firstPage(page)).toBe(expected);
  });
});

describe("two people at one entry", () => {
  const base = begun();

  it("keep what each changed alone", () => {
    const mine = withProperty(base, "voltageV", 240);
    const theirs = withSource(withProperty(base, "interruptingKA", 22), "interruptingKA", SHEET);
    const { draft, clashes, taken } = mergeDrafts(breaker, base, mine, theirs);
    expect(draft.data.props).toMatchObject({ ratingA: 60, poles: 2, voltageV: 240, interruptingKA: 22 });
    expect(draft.data.sources).toEqual({ ratingA: SHEET, interruptingKA: SHEET });
    expect(clashes).toEqual([]);
    expect(taken.map((each) => [each.label, each.now])).toEqual([["Interrupting rating", 22], ["Interrupting rating: datasheet", "Sheet"], ["Interrupting rating: page", "3"]]);
  });

  it("see both sides of what both changed; mine stands until theirs is chosen", () => {
    const mine = { ...withProperty(base, "ratingA", 70), name: "Mine" };
    const theirs = { ...withSource(withProperty(base, "ratingA", 80), "ratingA", { document: "Sheet", page: "4" }), name: "Theirs" };
    const { draft, clashes } = mergeDrafts(breaker, base, mine, theirs);
    expect(clashes.map((each) => [each.part, each.lines.map((line) => [line.drawn, line.now])])).toEqual([["name", [["Mine", "Theirs"]]], ["props/ratingA", [[70, 80]]]]);
    expect(draft).toMatchObject({ name: "Mine", data: { props: { ratingA: 70 }, sources: { ratingA: { page: "4" } } } });
    expect(withTheirs(withTheirs(draft, theirs, "name"), theirs, "props/ratingA")).toMatchObject({ name: "Theirs", data: { props: { ratingA: 80 } } });
  });

  it("have no quarrel where both wrote the same", () => {
    const same = withProperty(base, "ratingA", 90);
    expect(mergeDrafts(breaker, base, same, same)).toMatchObject({ clashes: [], taken: [], draft: { data: { props: { ratingA: 90 } } } });
  });

  it("can take away what the other left, a source and a port alike", () => {
    const held = withPort(base, "line", { nominalV: 240 });
    const mine = withSource(held, "ratingA", { document: "", page: "" });
    expect(mergeDrafts(breaker, held, mine, withProperty(held, "voltageV", 240)).draft.data).toMatchObject({ sources: {}, ports: { line: { nominalV: 240 } } });
    const theirs = { ...held, data: { ...held.data, ports: {} } };
    const merge = mergeDrafts(breaker, held, withPort(held, "line", { nominalV: 120 }), theirs);
    expect(merge.clashes.map((each) => each.part)).toEqual(["ports/line"]);
    expect(withTheirs(merge.draft, theirs, "ports/line").data.ports).toEqual({});
  });
});

it("two versions differ in what was changed, said as it was and as it became", () => {
  const from = begun();
  expect(versionDifferences(breaker, from.data, withProperty(from, "ratingA", null).data)).toEqual([{ path: "/props/ratingA", label: "Trip rating", unit: "A", drawn: 60, now: null }]);
});
