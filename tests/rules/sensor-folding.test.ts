import { describe, expect, it } from "vitest";
import { applyCommand } from "@/lib/diagram/commands";
import { checkDocument } from "@/lib/diagram/check";
import { check } from "@/lib/rules/engine/run";
import { cleanDrawing } from "@/seeders/demo/cleanDrawing";
import { reroute } from "./support";

describe("leads of sensors", () => {
  it("a Class 2 lead beside power is one finding, with what it does to the sensor inside", () => {
    const drawing = cleanDrawing();
    reroute(drawing, "k-4", ["n-3", "ww-1", "n-1"]);
    const found = check(drawing).findings.filter((each) => each.kind === "finding" && each.rule !== "nipple-overfill");
    expect(found.map((each) => each.rule)).toEqual(["class2-with-power"]);
    expect(found[0]?.folded.map((each) => each.rule)).toContain("ct-in-power-raceway");
  });
  it("a lead that is no circuit of the drawing is refused, and goes with its circuit", () => {
    const drawing = cleanDrawing();
    drawing.sensors["ct-1"]!.lead = "nowhere";
    expect(checkDocument(drawing).map((fault) => fault.path)).toEqual(["/sensors/ct-1/lead"]);
    const done = applyCommand(cleanDrawing(), { type: "deleteElements", refs: [{ collection: "circuits", id: "k-4" }] });
    expect(done.ok && [done.drawing.sensors["ct-1"]?.lead, done.drawing.sensors["ct-3"]?.lead]).toEqual([null, "k-5"]);
  });
});
