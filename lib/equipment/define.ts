/**
 * How an equipment kind describes itself. Forms, validation, schedules, symbols and rules
 * all read this one description, so that a new kind is one folder and nothing else.
 */

/** Conductor systems that never share a terminal. `ground` is bonding and electrode wiring. */
export const SYSTEMS = ["ac", "pv-dc", "battery-dc", "data", "ground"] as const;
export type System = (typeof SYSTEMS)[number];

export type Pole = "L1" | "L2" | "L3" | "N" | "+" | "-" | "G" | "D";

interface PropertyBase {
  /** Words shown beside the field, in the trade's terms. */
  label: string;
  /** Heading under which the form lists it. */
  group: "rating" | "settings" | "construction" | "place" | "identity";
  /** True when the value comes from a datasheet, so its source (document, page) is asked for. */
  rated?: boolean;
  help?: string;
}
export interface NumberProperty extends PropertyBase {
  type: "number";
  /** Unit as printed, for example A, V, kA, kWh, °C, in, ft. Empty for plain counts. */
  unit: string;
  min: number;
  max: number;
  integer?: boolean;
}
export interface TextProperty extends PropertyBase { type: "text"; maxLength: number }
export interface ChoiceProperty<T extends string = string> extends PropertyBase { type: "choice"; options: readonly T[] }
export interface FlagProperty extends PropertyBase { type: "flag" }
export type Property = NumberProperty | TextProperty | ChoiceProperty | FlagProperty;
export type Properties = Readonly<Record<string, Property>>;

/** Value of a property. `null` is a value of its own: not known yet, to be asked for. */
export type PropertyValue = number | string | boolean | null;
export type ValueOf<P extends Property> = P extends NumberProperty
  ? number | null
  : P extends ChoiceProperty<infer T> ? T | null
  : P extends FlagProperty ? boolean | null
  : string | null;
export type PropsOf<P extends Properties> = { [K in keyof P]: ValueOf<P[K]> };

type Extra = Partial<Omit<PropertyBase, "label">>;
/** A measured or rated number. */
export function number(label: string, unit: string, min: number, max: number, extra: Extra & { integer?: boolean } = {}): NumberProperty {
  return { type: "number", label, unit, min, max, group: "rating", ...extra };
}
/** A choice among the trade's words. */
export function choice<const T extends readonly string[]>(label: string, options: T, extra: Extra = {}): ChoiceProperty<T[number]> {
  return { type: "choice", label, options, group: "construction", ...extra };
}
/** A yes-or-no fact. */
export function flag(label: string, extra: Extra = {}): FlagProperty {
  return { type: "flag", label, group: "construction", ...extra };
}
/** A short text. */
export function text(label: string, maxLength = 80, extra: Extra = {}): TextProperty {
  return { type: "text", label, maxLength, group: "identity", ...extra };
}

export type Side = "left" | "right" | "top" | "bottom";

/** A place where a circuit may land. Positions are grid units (1/8 in at half size) from the symbol's origin, unrotated. */
export interface PortDefinition {
  id: string;
  label: string;
  system: System;
  side: Side;
  x: number;
  y: number;
  poles: readonly Pole[];
  /** Several circuits may land here (a bus, a neutral bar, a ground bar). Otherwise one. */
  many?: boolean;
}

/** What a kind can do. Rules and states ask for these, never for a kind's name, so new kinds join in by themselves. */
export interface Capabilities {
  /** Supplies energy by itself. Inverters are converters, not sources. */
  source?: "utility" | "generator" | "pv" | "battery";
  /** Joins ac with dc ports; forms or follows ac. */
  converter?: boolean;
  /** A converter that follows the voltage of another source and never holds an island by itself. */
  follower?: boolean;
  /** Its two sides have currents and a neutral of their own. */
  transformer?: boolean;
  /** Uses energy. `motor` and `hvac` follow their own overcurrent articles. */
  load?: "general" | "motor" | "hvac";
  /** Opens and closes its line and load ports. `transfer` joins its common port to one of two. */
  switching?: "breaker" | "switch" | "contactor" | "transfer";
  /** Opens by itself on overcurrent; its rating is the property `ratingA`. */
  overcurrent?: boolean;
  /** Has a busbar: port `bus` takes many circuits; its rating is the property `busA`. */
  bus?: boolean;
  /** Other equipment may stand inside it. */
  enclosure?: boolean;
  /** Has a neutral bar on which grounded conductors of its own and its parts' circuits land. */
  neutralBar?: boolean;
  /** Stands at or ahead of the service disconnect when so marked by property `serviceEquipment`. */
  service?: boolean;
  electrode?: boolean;
}

/** A path inside the equipment from port to port. */
export interface InternalJoin {
  a: string;
  b: string;
  /** `solid` always conducts; `switch` while closed; `throw` in the named position of a transfer switch; `converter` carries power but no fault path or neutral. */
  by: "solid" | "switch" | "throw" | "converter";
  position?: string;
}

export interface KindDefinition<P extends Properties = Properties> {
  kind: string;
  /** Name on screens and schedules. */
  title: string;
  /** Tag prefix after reference-designator practice: CB, DS, INV. */
  tagPrefix: string;
  /** Heading in the parts rail. */
  railGroup: "sources" | "switch and protect" | "convert and distribute" | "loads" | "route and ground";
  properties: P;
  /** Values a new one starts with; everything left out starts as null (not known). */
  defaults: Partial<PropsOf<P>>;
  capabilities: Capabilities;
  /** Symbol id in lib/symbols, or null for an enclosure drawn as a box. */
  symbol: (props: PropsOf<P>) => string | null;
  /** Box for hit testing, in grid units around the origin; enclosures may be resized. */
  box: { x: number; y: number; width: number; height: number };
  ports: (props: PropsOf<P>) => readonly PortDefinition[];
  joins: (props: PropsOf<P>) => readonly InternalJoin[];
  /** Lines printed beside the tag on the one-line, shortest first. */
  annotation: (props: PropsOf<P>) => readonly string[];
  /** Properties shown as columns of the equipment schedule, in order. */
  scheduleFields: readonly (keyof P & string)[];
}

/** Declares a kind. The call only fixes the types; nothing is registered by running it. */
export function defineKind<const P extends Properties>(definition: KindDefinition<P>): KindDefinition<P> {
  return definition;
}
