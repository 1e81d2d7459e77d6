import type { Drawing, Equipment } from "@/lib/diagram/schema";
import { kindDefinition } from "@/lib/equipment/registry";
import { mainOf } from "./panels";
import { line, type LineContext, type VisitLine } from "./line";

const NOT_STATED = "The visit does not say who stated it. Available fault current is what the utility states, not what is read at the site.";

const byCapability = (drawing: Drawing, fits: (each: Equipment) => boolean): [string, Equipment][] => Object.entries(drawing.equipment).filter(([, each]) => fits(each));

/** What belongs to the service: site data, the utility on the drawing, the main of the service equipment. */
export function serviceLines({ drawing, visit, choices, source }: LineContext): VisitLine[] {
  const { service } = visit.data;
  const { site } = drawing;
  const current = service.availableFaultCurrentA;
  const stated = service.faultCurrentStatedBy;
  const caution = stated === null ? NOT_STATED : null;
  const utilities = byCapability(drawing, (each) => kindDefinition(each.kind).capabilities.source === "utility");
  return [
    ...line(source, {
      key: "site.utilityName", target: "Site", field: "Utility", before: site.utilityName, after: service.utilityName,
      commands: [{ type: "setSite", change: { utilityName: service.utilityName } }],
    }),
    ...line(source, {
      key: "site.availableFaultCurrentA", target: "Site", field: "Available fault current", unit: "A", before: site.availableFaultCurrentA, after: current, caution,
      commands: [{ type: "setSite", change: { availableFaultCurrentA: current, faultCurrentSource: [stated, source].filter(Boolean).join("; ").slice(0, 160), faultCurrentOn: visit.visitedOn } }],
    }),
    ...line(source, {
      key: "site.serviceSystem", target: "Site", field: "Service", before: site.serviceSystem, after: service.system,
      commands: [{ type: "setSite", change: { serviceSystem: service.system } }],
    }),
    ...utilities.flatMap(([id, each]) => [
      ...line(source, {
        key: `utility.${id}.name`, target: each.tag, field: "Utility", before: each.props.name, after: service.utilityName,
        commands: [{ type: "setProperty", id, name: "name", value: service.utilityName }],
      }),
      ...line(source, {
        key: `utility.${id}.availableFaultCurrentA`, target: each.tag, field: "Available fault current", unit: "A", before: each.props.availableFaultCurrentA, after: current, caution,
        commands: [{ type: "setProperty", id, name: "availableFaultCurrentA", value: current, source: { document: source.slice(0, 120), page: (stated ?? "").slice(0, 40) } }],
      }),
    ]),
    ...mainLine({ drawing, visit, choices, source }),
    ...bondLine({ drawing, visit, choices, source }),
  ];
}

const serviceEquipment = (drawing: Drawing) => byCapability(drawing, (each) => kindDefinition(each.kind).capabilities.bus === true && each.props.serviceEquipment === true);

/** A bond that was seen in the one piece of service equipment is fitted. One that was not seen may still be there, so that says nothing. */
function bondLine({ drawing, visit, source }: LineContext): VisitLine[] {
  const [only, ...others] = serviceEquipment(drawing);
  if (!only || others.length > 0 || visit.data.grounding.bondSeen !== "yes") return [];
  const bonds = Object.entries(drawing.bonds).filter(([, bond]) => bond.equipment === only[0]);
  return bonds.length !== 1 ? [] : bonds.flatMap(([id, bond]) => line(source, {
    key: `bond.${id}.fitted`, target: `${bond.tag} in ${only[1].tag}`, field: "Fitted", before: bond.fitted, after: true, commands: [{ type: "setBond", id, change: { fitted: true } }],
  }));
}

/** Rating of the service's main, where the drawing has one piece of service equipment and no panel of the visit says it already. */
function mainLine({ drawing, visit, choices, source }: LineContext): VisitLine[] {
  const [only, ...others] = serviceEquipment(drawing);
  if (!only || others.length > 0) return [];
  const [id, panel] = only;
  const said = visit.data.panels.some((each) => { const choice = choices.panels[each.id]; return choice?.as === "update" && choice.id === id && each.mainA !== null; });
  const main = mainOf(drawing, id);
  if (said || !main) return [];
  const value = visit.data.service.mainRatingA;
  return line(source, {
    key: `service.${main.id}.ratingA`, target: `${main.equipment.tag} in ${panel.tag}`, field: "Trip rating", unit: "A", before: main.equipment.props.ratingA, after: value,
    commands: [{ type: "setProperty", id: main.id, name: "ratingA", value, source: { document: source.slice(0, 120), page: "as read at the service" } }],
  });
}
