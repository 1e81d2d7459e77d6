import { nodeKey } from "@/lib/diagram/graph";
import { MUST_FIX_TO_2023, sameSection } from "@/lib/rules/engine/meta";
import type { CheckContext, Outcome, Rule } from "@/lib/rules/engine/types";
import { deviceRatingA } from "@/lib/rules/shared/conductors";
import { circuitRef, equipmentRef, found, nameOf, NOT_APPLICABLE, numberOf, PASS, propertyLabel, Reader } from "@/lib/rules/shared/outcome";
import { compact, comparison, smallerDevice, uniqueRefs } from "@/lib/rules/shared/protection";
import { topology } from "@/lib/rules/shared/topology";

interface Limited { port: string; limitA: number | null; field: string; asked: boolean }

/** Ports with a largest device on the nameplate. Inverters and air conditioning always carry one; other equipment only where marked. */
function limitedPorts(context: CheckContext, id: string): readonly Limited[] {
  const { capabilities } = context.graph.kind(id);
  const hvac = capabilities.load !== undefined && context.drawing.equipment[id]?.props.use === "air conditioning or refrigeration";
  return context.graph.ports(id).filter((port) => port.system !== "data" && port.system !== "ground").flatMap((port): Limited[] => {
    const marked = port.data.maximumOvercurrentA ?? null;
    const own = port.system === "ac" && (capabilities.converter === true || capabilities.load !== undefined) ? numberOf(context, id, "maximumOvercurrentA") : null;
    if (marked !== null || own !== null) return [{ port: port.id, limitA: marked ?? own, field: marked !== null ? `ports.${port.id}.maximumOvercurrentA` : "props.maximumOvercurrentA", asked: true }];
    return port.system === "ac" && (capabilities.converter === true || hvac) ? [{ port: port.id, limitA: null, field: "props.maximumOvercurrentA", asked: true }] : [];
  });
}

function judgePort(context: CheckContext, id: string, limited: Limited): readonly Outcome[] {
  const ends = topology(context.graph).runsFrom(nodeKey(id, limited.port)).filter((run) => run.device !== null);
  if (ends.length === 0) return [NOT_APPLICABLE];
  if (limited.limitA === null) return [{ outcome: "needs-data", fields: [{ ref: equipmentRef(id), field: limited.field, label: propertyLabel(context, id, "maximumOvercurrentA") }] }];
  const limitA = limited.limitA;
  return ends.map((run): Outcome => {
    const device = run.device ?? "";
    const anchor = equipmentRef(device);
    const ratingA = deviceRatingA(context, device);
    if (ratingA === null) {
      const reader = new Reader(context);
      const field = topology(context.graph).ratingField(device) ?? "ratingA";
      reader.ask(anchor, `props.${field}`, propertyLabel(context, device, field));
      return reader.outcome();
    }
    if (ratingA <= limitA) return PASS;
    return found({
      variant: "above-nameplate", anchor, field: "props.ratingA", related: uniqueRefs([...run.circuits.map(circuitRef), equipmentRef(id)], anchor),
      message: `${nameOf(context, anchor)} is ${ratingA} A; ${nameOf(context, equipmentRef(id))} takes ${limitA} A at most by its nameplate.`,
      steps: [{ symbol: "Imax", expression: "largest device on the nameplate", substituted: nameOf(context, equipmentRef(id)), result: limitA, unit: "A", citation: "110.3(B)" }, comparison("In", ratingA, limitA, "A", false)],
    });
  });
}

export const ocpdAboveNameplate: Rule = {
  meta: {
    id: "ocpd-above-nameplate", group: "Conductors and overcurrent", severity: "must-fix", evidence: "rated",
    statement: "An overcurrent device may not be above the maximum printed on the equipment it protects.",
    risk: "The equipment was never tested behind a larger device and its listing no longer holds.",
    citations: sameSection("110.3(B)"), mustFixAllowed: MUST_FIX_TO_2023, limits: {},
    reads: ["equipment.props.maximumOvercurrentA", "equipment.ports.maximumOvercurrentA", "equipment.props.ratingA", "circuits.from", "circuits.to"], absorbs: [],
  },
  subjects: ({ drawing }) => Object.keys(drawing.equipment).sort().map(equipmentRef),
  evaluate: ({ id }, context) => {
    const ports = limitedPorts(context, id);
    return ports.length === 0 ? NOT_APPLICABLE : ports.flatMap((port) => judgePort(context, id, port));
  },
  suggest: (finding, context) => {
    const device = finding.anchor.id;
    const limits = finding.related.filter((ref) => ref.collection === "equipment").flatMap((ref) => limitedPorts(context, ref.id).map((port) => port.limitA ?? Infinity));
    return compact([smallerDevice(context, device, finding.related.filter((ref) => ref.collection === "circuits").map((ref) => ref.id), deviceRatingA(context, device) ?? 0, (rating) => rating <= Math.min(...limits), "Check that it still carries the output.")]);
  },
  examples: { violates: "An inverter marked 50 A maximum behind a 60 A breaker.", passes: "The same inverter behind 45 A." },
};
