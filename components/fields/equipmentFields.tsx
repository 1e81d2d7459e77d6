"use client";
import { readNumber, readProperty, showValue } from "@/lib/client/readField";
import { TERMINAL_METALS, type PortData } from "@/lib/diagram/schema";
import type { PortDefinition, Properties, Property, PropertyValue } from "@/lib/equipment/define";
import { ChoiceField, FieldGroup, TextField, type FieldMark } from "./fields";

/** Headings under which a kind's properties are listed, in order. */
const GROUPS = [["rating", "Ratings"], ["settings", "Settings"], ["construction", "Construction"], ["place", "Place and working space"], ["identity", "Make and listing"]] as const;

export interface PropertyGroup { readonly id: Property["group"]; readonly title: string; readonly entries: readonly (readonly [name: string, property: Property])[]; readonly unknown: number }

/** The properties of a kind under their headings, with how many of each are not known; headings without any are left out. */
export function propertyGroups(properties: Properties, props: Readonly<Record<string, PropertyValue | undefined>>): PropertyGroup[] {
  return GROUPS.map(([id, title]) => {
    const entries = Object.entries(properties).filter(([, property]) => property.group === id);
    return { id, title, entries, unknown: entries.filter(([name]) => (props[name] ?? null) === null).length };
  }).filter((group) => group.entries.length > 0);
}
/** What a heading says about its fields. */
export const unknownWords = (unknown: number): string => (unknown > 0 ? `${unknown} not known` : "all known");

interface PropertyFieldProps {
  readonly property: Property;
  readonly value: PropertyValue | undefined;
  readonly readOnly: boolean;
  readonly mark?: FieldMark | null;
  readonly bare?: boolean;
  /** Takes the value; the answer is why not, or null. */
  readonly onCommit: (value: PropertyValue) => string | null;
}

/** Field of one property, as its description says. Numbers are read with any unit of their quantity. */
export function PropertyField({ property, value, readOnly, mark = null, bare = false, onCommit }: PropertyFieldProps) {
  const common = {
    label: property.label, value: showValue(value), readOnly, mark, bare,
    onCommit: (text: string) => { const answer = readProperty(text, property); return answer.ok ? onCommit(answer.value) : answer.reason; },
  };
  if (property.type === "choice") return <ChoiceField {...common} options={property.options} />;
  if (property.type === "flag") return <ChoiceField {...common} options={["yes", "no"]} />;
  return <TextField {...common} {...(property.type === "number" && property.unit ? { unit: property.unit } : {})} {...(property.help ? { hint: property.help } : {})} />;
}

const PORT_NUMBERS = [["continuousA", "Continuous", "A", 10000], ["maximumA", "Largest", "A", 10000], ["maximumOvercurrentA", "Largest device", "A", 10000], ["nominalV", "Nominal", "V", 40000], ["maximumV", "Largest", "V", 40000]] as const;
const UNKNOWN_TERMINAL: NonNullable<PortData["terminal"]> = { temperatureC: null, metals: null, smallest: null, largest: null, torqueLbfIn: null, torqueSource: null };

interface PortFieldsProps {
  readonly port: Pick<PortDefinition, "id" | "label" | "system" | "poles">;
  readonly data: PortData;
  readonly readOnly: boolean;
  readonly columns?: 2 | 4;
  /** Finding that names a field of the port, such as `terminal.metals`. */
  readonly mark?: (field: string) => FieldMark | null;
  /** Takes all values of the port; the answer is why not, or null. */
  readonly onCommit: (data: PortData) => string | null;
}

/** Ratings at a port and what is marked at its terminal. */
export function PortFields({ port, data, readOnly, columns = 2, mark = () => null, onCommit }: PortFieldsProps) {
  const terminal = data.terminal;
  // A port holds no values until the first is entered; the whole entry is written then.
  const setPort = (name: keyof PortData, value: unknown): string | null => onCommit({ ...data, [name]: value });
  const setTerminal = (name: string, value: unknown): string | null => setPort("terminal", { ...(terminal ?? UNKNOWN_TERMINAL), [name]: value });
  const common = { readOnly };
  const numberOf = (text: string, unit: string, low: number, high: number, take: (value: PropertyValue) => string | null, whole = false): string | null => {
    const answer = readNumber(text, unit, low, high, whole);
    return answer.ok ? take(answer.value) : answer.reason;
  };
  const words = (name: "smallest" | "largest" | "torqueSource", label: string) => (
    <TextField {...common} label={label} value={terminal?.[name] ?? ""} mark={mark(`terminal.${name}`)} onCommit={(typed) => setTerminal(name, typed.trim() || null)} />
  );
  return (
    <FieldGroup title={`${port.label} port`} note={port.poles.join(" ")} open={false} columns={columns}>
      {port.system !== "ground" && PORT_NUMBERS.map(([name, label, unit, most]) => (
        <TextField key={name} {...common} label={label} unit={unit} value={showValue(data[name])} mark={mark(name)} onCommit={(typed) => numberOf(typed, unit, 0, most, (value) => setPort(name, value))} />
      ))}
      <ChoiceField {...common} label="Terminal marked" value={terminal?.temperatureC?.toString() ?? ""} options={["60", "75", "90"]} words={{ 60: "60 °C", 75: "75 °C", 90: "90 °C" }} mark={mark("terminal.temperatureC")} onCommit={(value) => setTerminal("temperatureC", value ? Number(value) : null)} />
      <ChoiceField {...common} label="Metals" value={terminal?.metals ?? ""} options={TERMINAL_METALS} mark={mark("terminal.metals")} onCommit={(value) => setTerminal("metals", value || null)} />
      {words("smallest", "Smallest wire")}
      {words("largest", "Largest wire")}
      <TextField {...common} label="Torque" unit="lbf·in" value={showValue(terminal?.torqueLbfIn)} mark={mark("terminal.torqueLbfIn")} onCommit={(typed) => numberOf(typed, "lbf·in", 0.5, 5000, (value) => setTerminal("torqueLbfIn", value))} />
      {words("torqueSource", "Torque from")}
      <TextField {...common} label="Conductors in one" value={showValue(terminal?.conductorsMost)} mark={mark("terminal.conductorsMost")} onCommit={(typed) => numberOf(typed, "", 1, 12, (value) => setTerminal("conductorsMost", value), true)} />
      <YesNo {...common} label="For fine strands" value={terminal?.fineStrand} mark={mark("terminal.fineStrand")} onCommit={(value) => setTerminal("fineStrand", value)} />
      {(terminal?.temperatureC ?? null) === null && <YesNo {...common} label="No °C mark found" value={terminal?.noTemperatureMark} mark={mark("terminal.noTemperatureMark")} onCommit={(value) => setTerminal("noTemperatureMark", value)} />}
    </FieldGroup>
  );
}

type Choice = Parameters<typeof ChoiceField>[0];
/** A fact that is yes, no or not known. */
function YesNo({ value, onCommit, ...rest }: Pick<Choice, "label" | "readOnly" | "mark"> & { value: boolean | null | undefined; onCommit: (value: boolean | null) => string | null }) {
  return <ChoiceField {...rest} value={value === true ? "yes" : value === false ? "no" : ""} options={["yes", "no"]} onCommit={(chosen) => onCommit(chosen === "" ? null : chosen === "yes")} />;
}
