import { place, type DrawingBuilder } from "./build";

const INSIDE = { ambientC: 40, exposure: "indoor dry" as const };
const OUTSIDE = { ambientC: 33, exposure: "outdoor" as const };
const BURIED = { ambientC: 20, exposure: "underground" as const, burialDepthIn: 18 };
const INCH = 1 / 12;
const listed = { offSheet: true } as const;

/** Conduits, nipples, wireways and boxes. Those that would only crowd the one-line are kept off it and stand in the schedules. */
export function addRaceways(drawing: DrawingBuilder): void {
  const r = drawing.raceway.bind(drawing);
  r("R-0", "conduit", [8, 7], { ...listed, type: "RMC", tradeSize: "2-1/2", to: "mm-225", location: place("A", "outside east wall", "outdoor", 33) }, [{ lengthFt: 14, ...OUTSIDE }]);
  r("R-1a", "conduit", [24, 20], { ...listed, tradeSize: "1-1/2", from: "mm-225", to: "ds-1" }, [{ lengthFt: 6, ...OUTSIDE }]);
  r("R-1b", "conduit", [30, 20], { ...listed, tradeSize: "1-1/2", from: "ds-1", to: "ic-200", bendsDegrees: 180, sealed: true }, [{ lengthFt: 12, ...OUTSIDE }, { lengthFt: 28, ...INSIDE }]);
  r("R-4", "conduit", [80, 16.4], { tradeSize: "1-1/2", from: "ww-1", to: "pnl-c", bendsDegrees: 180, vertical: true, label: { x: 1.3, y: -0.6, anchor: "start" } }, [{ lengthFt: 30, ...INSIDE }]);
  r("R-5", "conduit", [61, 16], { type: "PVC 40", tradeSize: "1", metal: false, from: "g-1", to: "ww-1", sealed: true, vertical: true, label: { x: 1.3, y: -0.4, anchor: "start" } }, [{ lengthFt: 85, ...BURIED }]);
  r("R-7", "conduit", [24, 24], { ...listed, type: "PVC 40", tradeSize: "1-1/4", metal: false, from: "mm-225", to: "pnl-n", sealed: true }, [{ lengthFt: 110, ...BURIED }]);
  r("R-8", "conduit", [24, 28], { ...listed, type: "PVC 40", tradeSize: "3/4", metal: false, from: "mm-225", to: "ds-2", sealed: true }, [{ lengthFt: 60, ...BURIED }]);
  r("R-S", "conduit", [98.8, 18], { tradeSize: "1", from: "jb-1", to: "ww-2", bendsDegrees: 270, sealed: true, vertical: true, size: { width: 5.4, height: 1 }, label: { x: -0.4, y: 1, anchor: "end" } },
    [{ lengthFt: 8, ambientC: 33, exposure: "roof", aboveRoofIn: 1 }, { lengthFt: 54, ...INSIDE }]);
  const nipple = (tag: string, x: number, y: number, vertical: boolean, tradeSize: string, inches: number, from: string, to: string, change = {}) =>
    r(tag, "nipple", [x, y], { tradeSize, from, to, vertical, ...change }, [{ lengthFt: inches * INCH, ...INSIDE }]);
  nipple("N-1", 93.6, 28.7, true, "1", 10, "inv-1", "ww-1", { label: { x: 1.3, y: 0.2, anchor: "start" } });
  nipple("N-2", 62, 28.7, true, "1", 10, "inv-2", "ww-1", { label: { x: 1.3, y: 0.2, anchor: "start" } });
  nipple("N-3", 56.4, 23.7, false, "2", 10, "ww-1", "ic-200", { size: { width: 1, height: 5.8 }, at: { x: 55.9, y: 20.8 }, label: { x: -0.4, y: -1.3, anchor: "start" } });
  nipple("N-4", 93.1, 47.4, true, "1", 10, "ww-2", "inv-1", { size: { width: 5.8, height: 1 }, at: { x: 90.2, y: 46.9 }, label: { x: -0.4, y: 1, anchor: "end" } });
  nipple("N-5", 62.5, 47.4, true, "1", 10, "ww-2", "inv-2", { size: { width: 5.8, height: 1 }, at: { x: 59.6, y: 46.9 }, label: { x: -0.4, y: 1, anchor: "end" } });
  const bay = { location: place("A", "battery bay", "indoor dry", 40) };
  for (const [tag, pack] of [["N-6", 1], ["N-7", 2], ["N-8", 3], ["N-9", 4]] as const) nipple(tag, 86, 42.5, true, "2", 15, `bt-${pack}`, "ww-3", { ...listed, ...bay });
  for (const tag of ["N-10", "N-11"]) nipple(tag, 86, 39.5, true, "2", 10, "ww-3", "db-1", { ...listed, ...bay, sealed: true });
  nipple("N-12", 87.6, 37.3, false, "2", 4, "db-1", "inv-1", listed);
  nipple("N-13", 67.8, 37.3, false, "2", 4, "db-1", "inv-2", listed);
  const wireway = (tag: string, x: number, y: number, width: number, height: number, label: { x: number; y: number; anchor: "start" | "middle" }, change = {}) =>
    r(tag, "wireway", [x, y], { widthIn: 6, heightIn: 6, size: { width, height }, label, ...change }, [{ lengthFt: 5, ...INSIDE }]);
  wireway("WW-1", 57, 20, 40, 7.6, { x: 7.5, y: -0.7, anchor: "start" });
  wireway("WW-2", 57, 49.4, 40.6, 6.5, { x: 9.4, y: -0.6, anchor: "start" });
  wireway("WW-3", 67.8, 39.9, 17.6, 3, { x: 3, y: 1.25, anchor: "middle" }, bay);
  r("JB-1", "box", [92.4, 13], { widthIn: 12, heightIn: 10, depthIn: 6, size: { width: 12, height: 2.8 }, to: "r-s", location: place("A", "roof", "roof", 33), note: "ROOF BOX, 4X", label: { x: 6.2, y: 4.3, anchor: "end" } }, [{ lengthFt: 1, ambientC: 33, exposure: "roof" }]);
  r("JB-2", "box", [88, 46], { ...listed, widthIn: 8, heightIn: 8, depthIn: 4, size: { width: 2, height: 2 }, note: "CLASS 2 ONLY" }, [{ lengthFt: 1, ...INSIDE }]);
  const dataRun = (tag: string, lengthFt: number, from: string, to: string, stretch = INSIDE, change = {}) =>
    r(tag, "conduit", [88, 46], { ...listed, tradeSize: "3/4", from, to, ...change }, [{ lengthFt, ...stretch }]);
  dataRun("C-1a", 12, "bt-1", "jb-2");
  dataRun("C-1b", 8, "jb-2", "inv-1");
  dataRun("C-2a", 6, "ic-200", "jb-2");
  dataRun("C-2b", 8, "jb-2", "inv-1");
  dataRun("C-3", 90, "g-1", "jb-2", BURIED as unknown as typeof INSIDE, { type: "PVC 40", metal: false, sealed: true });
  for (const [tag, from, to] of [["C-4a", 1, 2], ["C-4b", 2, 3], ["C-4c", 3, 4]] as const) dataRun(tag, 4, `bt-${from}`, `bt-${to}`);
  dataRun("C-5a", 34, "rsd-1", "jb-2", OUTSIDE as unknown as typeof INSIDE, { sealed: true });
  dataRun("C-5b", 8, "jb-2", "inv-1");
  dataRun("C-6", 0.5, "jb-2", "inv-2");
}
