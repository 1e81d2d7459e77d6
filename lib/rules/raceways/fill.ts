import { racewayFill, smallestRaceway, type FilledRaceway, type FillItem } from "@/lib/calc";
import { RACEWAY_KINDS, type RacewayKind } from "@/lib/code";
import type { Raceway } from "@/lib/diagram/schema";
import { MUST_FIX_TO_2023, sameSection } from "@/lib/rules/engine/meta";
import type { CheckContext, FindingDraft, Outcome, Rule, RuleMeta, Suggestion } from "@/lib/rules/engine/types";
import { circuitRef, found, nameOf, NOT_APPLICABLE, PASS, racewayRef, Reader } from "@/lib/rules/shared/outcome";
import { askLength, circuitsIn, fillItemsOf, isNipple, isSleeve, racewayLengthFt } from "@/lib/rules/shared/raceways";
import { parseTradeSize } from "@/lib/units";

/** Which raceways a rule of the family judges; null while the length that decides is missing. */
type Member = (raceway: Raceway) => boolean | null;

function shape(context: CheckContext, id: string, raceway: Raceway, reader: Reader): FilledRaceway | null {
  const ref = racewayRef(id);
  const name = nameOf(context, ref);
  if (raceway.kind === "wireway") {
    if (raceway.widthIn === null) reader.ask(ref, "widthIn", `inside width of ${name}`);
    if (raceway.heightIn === null) reader.ask(ref, "heightIn", `inside height of ${name}`);
    return raceway.widthIn === null || raceway.heightIn === null ? null : { kind: raceway.metal === false ? "nonmetallic wireway" : "metal wireway", widthIn: raceway.widthIn, heightIn: raceway.heightIn };
  }
  const lengthFt = racewayLengthFt(raceway);
  if (lengthFt === null) askLength(reader, id, raceway);
  if (raceway.type === null) reader.ask(ref, "type", `kind of conduit or tubing of ${name}`);
  if (raceway.tradeSize === null) reader.ask(ref, "tradeSize", `trade size of ${name}`);
  if (lengthFt === null || raceway.type === null || raceway.tradeSize === null) return null;
  const kind = RACEWAY_KINDS.find((one) => one === raceway.type);
  return kind ? { kind, tradeSize: parseTradeSize(raceway.tradeSize), lengthIn: Math.max(lengthFt * 12, 0.01) } : null;
}

function evaluate(context: CheckContext, id: string, member: Member): Outcome {
  const raceway = context.drawing.raceways[id];
  if (!raceway || context.graph.occupants(id).length === 0 || isSleeve(context.graph, id)) return NOT_APPLICABLE;
  const reader = new Reader(context);
  const belongs = member(raceway);
  if (belongs === false) return NOT_APPLICABLE;
  if (belongs === null) { askLength(reader, id, raceway); return reader.outcome(); }
  const body = shape(context, id, raceway, reader);
  const items = fillItemsOf(context, id, reader);
  // More can only come on top: an overfill by what is known is one already.
  if (!body || (items.length === 0 && !reader.complete)) return reader.outcome();
  const fill = racewayFill({ edition: context.edition, raceway: body, items });
  if (fill.detail.fits) return reader.complete ? PASS : reader.outcome();
  if (!reader.complete && fill.detail.conductorCount < 3) return reader.outcome();
  const anchor = racewayRef(id);
  const circuits = circuitsIn(context.graph.occupants(id));
  return found({
    variant: "overfilled", anchor, field: raceway.kind === "wireway" ? "widthIn" : "tradeSize", related: circuits.map(circuitRef),
    message: `${nameOf(context, anchor)} is ${fill.value.toFixed(1)} % full, ${fill.detail.usedIn2.toFixed(3)} of ${fill.detail.totalIn2.toFixed(3)} in²; ${fill.detail.limitPct} % is the limit.`,
    steps: fill.steps,
  });
}

function larger(context: CheckContext, finding: FindingDraft): readonly Suggestion[] {
  const raceway = context.drawing.raceways[finding.anchor.id];
  if (!raceway) return [];
  const items: readonly FillItem[] = fillItemsOf(context, finding.anchor.id, new Reader(context));
  const name = nameOf(context, finding.anchor);
  const path = `/raceways/${finding.anchor.id}`;
  if (raceway.kind === "wireway") {
    for (const side of [4, 6, 8, 10, 12, 18, 24]) {
      if (side <= Math.min(raceway.widthIn ?? 0, raceway.heightIn ?? 0)) continue;
      const fill = racewayFill({ edition: context.edition, raceway: { kind: raceway.metal === false ? "nonmetallic wireway" : "metal wireway", widthIn: side, heightIn: side }, items });
      if (fill.detail.fits) return [{ label: `Make ${name} ${side} × ${side} in`, also: "", patches: [{ op: "replace", path: `${path}/widthIn`, value: side }, { op: "replace", path: `${path}/heightIn`, value: side }] }];
    }
    return [];
  }
  const kind: RacewayKind | undefined = RACEWAY_KINDS.find((one) => one === raceway.type);
  const lengthFt = racewayLengthFt(raceway);
  if (!kind || lengthFt === null) return [];
  const size = smallestRaceway({ edition: context.edition, kind, lengthIn: Math.max(lengthFt * 12, 0.01), items });
  return [{ label: `Make ${name} ${size.value} in`, also: "Check the knockouts.", patches: [{ op: "replace", path: `${path}/tradeSize`, value: size.value }] }];
}

function fillRule(meta: Pick<RuleMeta, "id" | "statement" | "citations">, member: Member, examples: Rule["examples"]): Rule {
  return {
    meta: {
      ...meta, group: "Raceways and separation", severity: "must-fix", evidence: "derived",
      risk: "Insulation is scraped off while pulling, and heat cannot leave.", mustFixAllowed: MUST_FIX_TO_2023, limits: {}, absorbs: [],
      reads: ["raceways.type", "raceways.tradeSize", "raceways.stretches.lengthFt", "raceways.widthIn", "raceways.heightIn", "raceways.from", "raceways.to", "circuits.sections.route", "circuits.sections.ungrounded", "circuits.sections.grounded", "circuits.sections.equipmentGround", "circuits.sections.cable"],
    },
    subjects: ({ drawing }) => Object.keys(drawing.raceways).sort().map(racewayRef),
    evaluate: ({ id }, context) => evaluate(context, id, member),
    suggest: (finding, context) => larger(context, finding),
    examples,
  };
}
const CHAPTER_9 = ["read", "agreed", "agreed"] as const;

/** Conduit or tubing by Table 1. */
export const conduitOverfill = fillRule({
  id: "conduit-overfill", citations: sameSection("Chapter 9 Table 1", CHAPTER_9),
  statement: "Conductors take at most 53 % of a conduit or tubing when one, 31 % when two, 40 % when more.",
}, (raceway) => { const nipple = isNipple(raceway); return raceway.kind === "wireway" || raceway.kind === "box" ? false : nipple === null ? null : !nipple; },
{ violates: "Nine 10 AWG THWN-2 in 1/2 in EMT: 62 %.", passes: "The same in 1 in EMT: 22 %." });

/** Nipple of 24 in or less. */
export const nippleOverfill = fillRule({
  id: "nipple-overfill", citations: sameSection("Chapter 9 Table 1, note 4", CHAPTER_9),
  statement: "A nipple of 24 in or less between enclosures may be filled to 60 %.",
}, (raceway) => isNipple(raceway),
{ violates: "Four 6 AWG and one 8 AWG in a 1/2 in RMC nipple: 76 %.", passes: "The same in a 3/4 in RMC nipple: 44 %." });

/** Wireway. */
export const wirewayOverfill = fillRule({
  id: "wireway-overfill", citations: sameSection("376.22(A)", ["agreed", "agreed", "agreed"]),
  statement: "Conductors take at most 20 % of the inside cross section of a wireway.",
}, (raceway) => raceway.kind === "wireway",
{ violates: "7.4 in² of conductors in a 6 × 6 in wireway: 20.6 %.", passes: "7.2 in² or less." });
