import type { KindDefinition } from "./define";
import { battery } from "./battery";
import { breaker } from "./breaker";
import { chargeController } from "./charge-controller";
import { combiner } from "./combiner";
import { contactor } from "./contactor";
import { dcBusCabinet } from "./dc-bus-cabinet";
import { disconnect } from "./disconnect";
import { electrode } from "./electrode";
import { fuseHolder } from "./fuse-holder";
import { gateway } from "./gateway";
import { generator } from "./generator";
import { hybridInverter } from "./hybrid-inverter";
import { interconnectCabinet } from "./interconnect-cabinet";
import { load } from "./load";
import { meter } from "./meter";
import { meterMain } from "./meter-main";
import { microinverterBranch } from "./microinverter-branch";
import { panelboard } from "./panelboard";
import { powerInlet } from "./power-inlet";
import { pvString } from "./pv-string";
import { pvSwitch } from "./pv-switch";
import { shutdownInitiator } from "./shutdown-initiator";
import { stringInverter } from "./string-inverter";
import { surgeProtector } from "./surge-protector";
import { transferSwitch } from "./transfer-switch";
import { transformer } from "./transformer";
import { utility } from "./utility";
import { vehicleCharger } from "./vehicle-charger";

/** Every kind of equipment, in the order of the parts rail. */
const kinds = {
  "utility": utility,
  "meter": meter,
  "meter-main": meterMain,
  "panelboard": panelboard,
  "interconnect-cabinet": interconnectCabinet,
  "dc-bus-cabinet": dcBusCabinet,
  "breaker": breaker,
  "disconnect": disconnect,
  "contactor": contactor,
  "transfer-switch": transferSwitch,
  "hybrid-inverter": hybridInverter,
  "pv-switch": pvSwitch,
  "battery": battery,
  "pv-string": pvString,
  "generator": generator,
  "load": load,
  "electrode": electrode,
  "surge-protector": surgeProtector,
  "shutdown-initiator": shutdownInitiator,
  "string-inverter": stringInverter,
  "microinverter-branch": microinverterBranch,
  "combiner": combiner,
  "fuse-holder": fuseHolder,
  "vehicle-charger": vehicleCharger,
  "power-inlet": powerInlet,
  "transformer": transformer,
  "charge-controller": chargeController,
  "gateway": gateway,
} as const;

export type KindId = keyof typeof kinds;
export const KIND_IDS = Object.keys(kinds) as readonly KindId[];
export const isKindId = (value: string): value is KindId => Object.hasOwn(kinds, value);
type Definition<K extends KindId> = (typeof kinds)[K];
/** Typed property values of a kind, for code that has asked for that kind by name. */
export type KindProps<K extends KindId> = Parameters<Definition<K>["symbol"]>[0];

/** Definition of a kind. Throws on a name that is not one: the document check refuses such drawings before this is asked. */
export function kindDefinition(kind: string): KindDefinition {
  if (!isKindId(kind)) throw new RangeError(`no equipment kind is named ${kind}`);
  return kinds[kind] as unknown as KindDefinition;
}
