/**
 * Typical outside diameters of conductors that Table 5 does not hold.
 * Source: USE-2 compact aluminum: cut sheet of one maker, 2010; PV wire: from memory, not citable.
 * Inches. Suggestions for an entry form only; a fill check asks for the diameter of the product.
 */
import type { ConductorSize } from "@/lib/units";

export const TYPICAL_PV_WIRE_OD: readonly { readonly size: ConductorSize; readonly outsideDiameterIn: number }[] = [
  { size: "12 AWG", outsideDiameterIn: 0.25 },
  { size: "10 AWG", outsideDiameterIn: 0.27 },
  { size: "8 AWG", outsideDiameterIn: 0.32 },
  { size: "6 AWG", outsideDiameterIn: 0.36 },
];

export const TYPICAL_USE2_ALUMINUM_OD: readonly { readonly size: ConductorSize; readonly outsideDiameterIn: number }[] = [
  { size: "6 AWG", outsideDiameterIn: 0.292 },
  { size: "4 AWG", outsideDiameterIn: 0.336 },
  { size: "2 AWG", outsideDiameterIn: 0.391 },
  { size: "1 AWG", outsideDiameterIn: 0.462 },
  { size: "1/0 AWG", outsideDiameterIn: 0.499 },
  { size: "2/0 AWG", outsideDiameterIn: 0.539 },
  { size: "3/0 AWG", outsideDiameterIn: 0.586 },
  { size: "4/0 AWG", outsideDiameterIn: 0.638 },
  { size: "250 kcmil", outsideDiameterIn: 0.713 },
  { size: "300 kcmil", outsideDiameterIn: 0.763 },
  { size: "350 kcmil", outsideDiameterIn: 0.809 },
  { size: "400 kcmil", outsideDiameterIn: 0.852 },
  { size: "500 kcmil", outsideDiameterIn: 0.929 },
  { size: "700 kcmil", outsideDiameterIn: 1.1 },
  { size: "750 kcmil", outsideDiameterIn: 1.131 },
  { size: "1000 kcmil", outsideDiameterIn: 1.283 },
];
