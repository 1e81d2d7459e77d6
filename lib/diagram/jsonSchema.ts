import { z } from "zod";
import { drawingSchema } from "@/lib/diagram/schema";
import type { Property } from "@/lib/equipment/define";
import { KIND_IDS, kindDefinition } from "@/lib/equipment/registry";

type Json = Record<string, unknown>;

/** What may stand in a property, `null` always being allowed: it means not known. */
function propertySchema(property: Property): Json {
  const description = [property.label, property.type === "number" && property.unit, property.help].filter(Boolean).join(", ");
  switch (property.type) {
    case "number": return { description, type: [property.integer ? "integer" : "number", "null"], minimum: property.min, maximum: property.max };
    case "choice": return { description, enum: [...property.options, null] };
    case "flag": return { description, type: ["boolean", "null"] };
    case "text": return { description, type: ["string", "null"], maxLength: property.maxLength };
  }
}

/** One kind: its properties, and in words the ports that circuits may name as their ends. */
function kindSchema(kind: (typeof KIND_IDS)[number]): Json {
  const definition = kindDefinition(kind);
  const blank = Object.fromEntries(Object.keys(definition.properties).map((name) => [name, (definition.defaults as Json)[name] ?? null]));
  const ports = definition.ports(blank as never).map((port) => `${port.id} (${port.system}, ${port.poles.join(" ")}${port.many ? ", many" : ""})`);
  return {
    if: { properties: { kind: { const: kind } }, required: ["kind"] },
    then: {
      title: definition.title,
      description: `Ports with the default values: ${ports.join("; ")}. Tags start with ${definition.tagPrefix}.`,
      properties: {
        props: { type: "object", properties: Object.fromEntries(Object.entries(definition.properties).map(([name, property]) => [name, propertySchema(property)])), additionalProperties: false },
      },
    },
  };
}

/**
 * JSON Schema (draft 2020-12) of a drawing file, kinds and their properties included. References between elements are
 * beyond a schema; the checker names those that do not hold.
 */
export function drawingJsonSchema(): Json {
  const base = z.toJSONSchema(drawingSchema, { target: "draft-2020-12" }) as unknown as Json & { properties: { equipment: { additionalProperties: Json } } };
  const equipment = base.properties.equipment.additionalProperties;
  const properties = { ...(equipment["properties"] as Json), kind: { description: "Kind of equipment", enum: [...KIND_IDS] } };
  base.properties.equipment.additionalProperties = { ...equipment, properties, allOf: KIND_IDS.map(kindSchema) };
  return {
    $schema: "https://json-schema.org/draft/2020-12/schema", title: "Ferrule drawing",
    description: "A one-line drawing. Positions are units of 1/8 in on the half-size print. null means not known yet, and a property that is left out means the same.",
    ...base,
  };
}
