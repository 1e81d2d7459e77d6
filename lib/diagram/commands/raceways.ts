import type { Drawing, Raceway } from "@/lib/diagram/schema";
import { free, need } from "./lookup";
import { nextTag, racewayPrefix } from "./tags";
import { Refusal, type Recipe } from "./types";

const SIZE: Record<Raceway["kind"], Raceway["size"]> = {
  conduit: { width: 2, height: 2 }, nipple: { width: 2, height: 2 }, wireway: { width: 30, height: 6 }, box: { width: 8, height: 3 },
};

export const placeRaceway: Recipe<"placeRaceway"> = (draft, command) => {
  free(draft, "raceways", command.id);
  const { kind } = command;
  const tube = kind === "conduit" || kind === "nipple";
  const made: Raceway = {
    kind, tag: command.tag ?? nextTag(draft as Drawing, racewayPrefix(kind)), status: "new", type: tube ? "EMT" : null, tradeSize: null,
    metal: kind === "wireway" ? true : null, widthIn: null, heightIn: null, depthIn: null,
    stretches: { t1: { order: 0, lengthFt: null, ambientC: null, exposure: null, aboveRoofIn: null, burialDepthIn: null } },
    bendsDegrees: null, compartments: kind === "wireway" ? { c1: { order: 0, name: "A", widthIn: null } } : {},
    from: null, to: null, sealed: null, location: { building: null, place: null, exposure: null, ambientC: null },
    at: command.at, size: SIZE[kind], vertical: false, label: null, note: "",
  };
  draft.raceways[command.id] = { ...made, ...command.change };
  return `place ${draft.raceways[command.id]?.tag ?? kind}`;
};

export const setRaceway: Recipe<"setRaceway"> = (draft, { id, change }) => {
  const each = need(draft, "raceways", id);
  Object.assign(each, change);
  return `change ${each.tag}`;
};

export const setStretch: Recipe<"setStretch"> = (draft, { raceway, stretch, change }) => {
  const each = need(draft, "raceways", raceway);
  const before = Object.hasOwn(each.stretches, stretch) ? each.stretches[stretch] : undefined;
  each.stretches[stretch] = {
    order: Object.keys(each.stretches).length, lengthFt: null, ambientC: null, exposure: null, aboveRoofIn: null, burialDepthIn: null, ...before, ...change,
  };
  return `change ${each.tag}`;
};

export const removeStretch: Recipe<"removeStretch"> = (draft, { raceway, stretch }) => {
  const each = need(draft, "raceways", raceway);
  if (Object.keys(each.stretches).length <= 1) throw new Refusal("A raceway keeps one stretch.");
  delete each.stretches[stretch];
  return `change ${each.tag}`;
};

export const setCompartment: Recipe<"setCompartment"> = (draft, { raceway, compartment, name, widthIn }) => {
  const each = need(draft, "raceways", raceway);
  if (each.kind !== "wireway" && each.kind !== "box") throw new Refusal("Only wireways and boxes have compartments.");
  const order = Object.hasOwn(each.compartments, compartment) ? each.compartments[compartment]?.order ?? 0 : Object.keys(each.compartments).length;
  each.compartments[compartment] = { order, name, widthIn };
  return `change compartments of ${each.tag}`;
};

export const removeCompartment: Recipe<"removeCompartment"> = (draft, { raceway, compartment }, say) => {
  const each = need(draft, "raceways", raceway);
  delete each.compartments[compartment];
  const left = Object.keys(each.compartments);
  let moved = 0;
  for (const circuit of Object.values(draft.circuits)) {
    for (const section of Object.values(circuit.sections)) {
      if (!section.route.some((step) => step.raceway === raceway && step.compartment === compartment)) continue;
      section.route = section.route.map((step) => (step.raceway === raceway && step.compartment === compartment ? { raceway, compartment: left[0] ?? null } : { ...step }));
      moved += 1;
    }
  }
  if (moved > 0) say(`${moved} circuit${moved === 1 ? "" : "s"} moved to the other compartment.`);
  return `remove a divider of ${each.tag}`;
};
