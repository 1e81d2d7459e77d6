import { describe, expect, it } from "vitest";
import type { Drawing, Torque } from "@/lib/diagram/schema";
import { check } from "@/lib/rules/engine/run";
import { cleanDrawing } from "@/seeders/demo/cleanDrawing";

const found = (drawing: Drawing, rule: string) => check(drawing).findings.find((each) => each.rule === rule && each.kind === "finding");
function recorded(change: Partial<Torque>, edition: Drawing["site"]["edition"] = "2023"): Drawing {
  const drawing = cleanDrawing();
  drawing.site.edition = edition;
  drawing.torques = { "t1": { equipment: "cb-b4", port: "load", specifiedLbfIn: 106, achievedLbfIn: 106, tolerancePercent: null, tool: "wrench 3", toolDueOn: "2026-12-01", on: "2026-05-02", by: "field crew", ...change } };
  return drawing;
}

describe("severity by edition and by what the maker states", () => {
  it("a torque outside a single value should be fixed, outside a range the maker states it must", () => {
    expect(found(recorded({ achievedLbfIn: 35 }), "torque-out-of-band")?.severity).toBe("should-fix");
    expect(found(recorded({ achievedLbfIn: 112, tolerancePercent: 5 }), "torque-out-of-band")?.severity).toBe("must-fix");
    const unread = recorded({ achievedLbfIn: 112, tolerancePercent: 5 });
    unread.equipment["cb-b4"]!.ports["load"]!.terminal!.torqueSource = null;
    expect(found(unread, "torque-out-of-band")?.severity).toBe("should-fix");
  });
  it("a tool out of date is advice, and should be fixed where the edition asks for a calibrated tool", () => {
    expect(found(recorded({ toolDueOn: "2026-03-01" }), "torque-tool-stale")?.severity).toBe("advice");
    expect(found(recorded({ toolDueOn: "2026-03-01" }, "2017"), "torque-tool-stale")?.severity).toBe("should-fix");
  });
  it("a back-fed plug-on breaker is must-fix where the section was read, and says to verify it where not", () => {
    for (const [edition, severity] of [["2017", "must-fix"], ["2020", "should-fix"], ["2023", "must-fix"], ["2026", "should-fix"]] as const) {
      const drawing = cleanDrawing();
      drawing.site.edition = edition;
      drawing.equipment["cb-i2"]!.props.mount = "plug-on";
      expect(found(drawing, "backfed-not-secured")?.severity, edition).toBe(severity);
    }
  });
  it("lists what follows from one fault inside it", () => {
    const drawing = cleanDrawing();
    delete drawing.bonds["mbj"];
    const parent = found(drawing, "neutral-bond-count");
    expect(parent?.folded.map((each) => each.rule)).toContain("slash-rated-breaker");
    expect(found(drawing, "slash-rated-breaker")).toBeUndefined();
  });
});
