import { unit as mathUnit } from "mathjs";
import { describe, expect, it } from "vitest";
import {
  circularMils, compareSizes, CONDUCTOR_SIZES, convert, convertTemperatureDifference, dimensionOf, FieldError, formatInches, formatNumber, formatQuantity, formatSystemVoltage, isConductorSize, isUnit, nextLargerSize,
  parseConductorSize, parseIn, parseNumber, parseQuantity, parseSystemVoltage, parseTradeSize, QuantityError, readUnit, roundForShow, sizeForCircularMils, sizeIndex, tradeSizeIn, UNITS, type Unit,
} from "@/lib/units";

const refusal = (run: () => unknown): FieldError => {
  try {
    run();
  } catch (error) {
    if (error instanceof FieldError) return error;
    throw error;
  }
  throw new Error("nothing was refused");
};

describe("quantities as the trade writes them", () => {
  it.each<[string, number, Unit]>([
    ['1-1/4"', 1.25, "in"], ["1 1/4 in", 1.25, "in"], ["1¼ in", 1.25, "in"], ["½\"", 0.5, "in"], ["16 lbf·ft", 16, "lbf·ft"], ["16 lbf-ft", 16, "lbf·ft"], ["16 ft-lb", 16, "lbf·ft"], ["192 lbf·in", 192, "lbf·in"],
    ["192 in-lbs", 192, "lbf·in"], ["25 N·m", 25, "N·m"], ["25 Nm", 25, "N·m"], ["−24 °C", -24, "°C"], ["-24 C", -24, "°C"], ["75 °F", 75, "°F"], ["10,400 A", 10400, "A"], ["10.4 kA", 10.4, "kA"], ["31.7 amps", 31.7, "A"],
    ["600 Vdc", 600, "V"], ["7.8 kW", 7.8, "kW"], ["7.8 kVA", 7.8, "kVA"], ["12.5 kWh", 12.5, "kWh"], ["5 mΩ", 5, "mΩ"], ["5 MΩ", 5, "MΩ"], ["250 kcmil", 250, "kcmil"], ["250 MCM", 250, "kcmil"], ["0.0507 in²", 0.0507, "in²"],
    ["42.5 in3", 42.5, "in³"], ["28.4 %", 28.4, "%"], [".53 in", 0.53, "in"], ["100 Ah", 100, "Ah"], ["30 s", 30, "s"], ["3.5e1 ft", 35, "ft"],
  ])("%s", (text, value, unit) => expect(parseQuantity(text)).toEqual({ value, unit }));

  it("reads feet with inches", () => {
    expect(parseQuantity("5' 6\"").value).toBeCloseTo(5.5, 12);
    expect(parseQuantity("5 ft 6-1/2 in").value).toBeCloseTo(5 + 6.5 / 12, 12);
  });

  it.each([["", "does not start"], ["A", "does not start"], ["12", "no unit"], ["12 furlongs", "not known"], ["120/240 V", "fraction"], ["1/0", "fraction"], ["1e999 A", "finite"], ["NaN A", "does not start"], ["Infinity V", "does not start"], ["12 A 5", "not known"]])("refuses %j", (text, reason) => {
    const error = refusal(() => parseQuantity(text, "currentA"));
    expect(error).toBeInstanceOf(QuantityError);
    expect(error.field).toBe("currentA");
    expect(error.reason).toContain(reason);
  });
  it.each([[undefined, "missing"], [null, "missing"], [12, "text"], [{}, "text"]])("refuses %j", (value, reason) => expect(refusal(() => parseQuantity(value, "x")).reason).toContain(reason));

  it("never mixes units silently", () => {
    expect(parseIn("16 lbf·ft", "lbf·in", "torque")).toBe(192);
    expect(parseIn("-11.2 °F", "°C")).toBeCloseTo(-24, 10);
    expect(refusal(() => parseIn("16 A", "V", "voltageV"))).toMatchObject({ field: "voltageV", allowed: "V, mV, kV" });
    expect(refusal(() => parseIn("7.8 kVA", "kW")).reason).toBe("kVA measures apparent power, not power");
    expect(refusal(() => convert(1, "lbf·in", "ft")).reason).toContain("torque");
  });
  it("reads plain numbers and fractions of a scale only", () => {
    expect(["1-1/4", "10,400", "−24", "3/8"].map((text) => parseNumber(text))).toEqual([1.25, 10400, -24, 0.375]);
    expect(refusal(() => parseNumber("5 A")).reason).toContain("plain number");
    expect(readUnit("mΩ")).toBe("mΩ");
    expect(readUnit("toString")).toBeNull();
    expect(isUnit("constructor")).toBe(false);
  });
});

describe("conversion", () => {
  /** The same unit as the reference library spells it; torque as force times length. */
  const spelled: Partial<Record<Unit, string>> = {
    A: "A", mA: "mA", kA: "kA", V: "V", mV: "mV", kV: "kV", W: "W", kW: "kW", MW: "MW", hp: "hp", Wh: "W h", kWh: "kW h", MJ: "MJ", "Ω": "ohm", "mΩ": "mohm", "kΩ": "kohm", "MΩ": "Mohm", mm: "mm", m: "m", in: "in", ft: "ft",
    "mm²": "mm^2", "in²": "in^2", "cm³": "cm^3", "in³": "in^3", "N·m": "N m", "lbf·in": "lbf in", "lbf·ft": "lbf ft", s: "s", min: "minute", h: "hour", Hz: "Hz",
  };
  it("agrees with a general units library in every pair it knows", () => {
    let pairs = 0;
    for (const from of UNITS) {
      for (const to of UNITS) {
        const a = spelled[from];
        const b = spelled[to];
        if (a === undefined || b === undefined) continue;
        // Torque and energy are one dimension there and two here: a lug is not tightened in watt-hours.
        if (dimensionOf(from) !== dimensionOf(to)) {
          expect(() => convert(7.3, from, to), `${from} ${to}`).toThrow(QuantityError);
          continue;
        }
        const expected = mathUnit(7.3, a).toNumber(b);
        expect(Math.abs(convert(7.3, from, to) / expected - 1), `${from} → ${to}`).toBeLessThan(1e-9);
        pairs += 1;
      }
    }
    expect(pairs).toBeGreaterThan(80);
    expect(convert(1, "Ω/kft", "Ω/km")).toBeCloseTo(mathUnit(1000, "m").toNumber("ft") / 1000, 10);
    expect(convert(75, "°F", "°C")).toBeCloseTo(mathUnit(75, "degF").toNumber("degC"), 10);
    expect(convert(-24, "°C", "°F")).toBeCloseTo(mathUnit(-24, "degC").toNumber("degF"), 10);
  });
  it("16 lbf·ft is 192 lbf·in on a breaker terminal (common practice, no published source)", () => {
    expect(convert(16, "lbf·ft", "lbf·in")).toBe(192);
    expect(convert(192, "lbf·in", "lbf·ft")).toBe(16);
  });
  it("250 lbf·in on a cabinet lug is 28.2 N·m (common practice, no published source)", () => expect(convert(250, "lbf·in", "N·m")).toBeCloseTo(28.2, 1));
  it("keeps a difference of temperatures apart from a temperature", () => {
    expect(convertTemperatureDifference(60, "°F", "°C")).toBeCloseTo(33.3, 1);
    expect(convert(60, "°F", "°C")).toBeCloseTo(15.6, 1);
    expect(() => convertTemperatureDifference(Number.NaN, "°F", "°C")).toThrow(QuantityError);
  });
  it("refuses what is no number", () => {
    for (const value of [Number.NaN, Infinity, -Infinity]) expect(refusal(() => convert(value, "A", "kA", "currentA")).field).toBe("currentA");
    expect(refusal(() => convert(1e308, "kA", "mA", "currentA")).reason).toContain("finite");
  });
  it("areas of wire: 4/0 is 107 mm², 250 kcmil 127 mm² (Table 8, metric column)", () => {
    expect(convert(211600, "cmil", "mm²")).toBeCloseTo(107.2, 1);
    expect(convert(250, "kcmil", "mm²")).toBeCloseTo(126.7, 1);
  });
});

describe("conductor and trade sizes", () => {
  it.each([["#8", "8 AWG"], ["8", "8 AWG"], [8, "8 AWG"], ["8 awg", "8 AWG"], ["No. 8", "8 AWG"], ["1/0", "1/0 AWG"], ["0", "1/0 AWG"], ["0000", "4/0 AWG"], ["4/0 AWG", "4/0 AWG"], ["250", "250 kcmil"], [" 250  kcmil ", "250 kcmil"], ["500MCM", "500 kcmil"], ["#1/0", "1/0 AWG"]])("%j is %s", (text, size) => expect(parseConductorSize(text)).toBe(size));
  it.each(["", "5", "7 AWG", "250 AWG", "8 kcmil", "5/0", "240", "10 mm²", "AWG", "1/0/0", null, undefined, {}, Number.NaN])("refuses %j", (value) => {
    const error = refusal(() => parseConductorSize(value, "size"));
    expect([error.field, error.allowed]).toEqual(["size", "18 AWG to 4/0 AWG, 250 kcmil to 2000 kcmil"]);
  });
  it("orders by area", () => {
    expect([...CONDUCTOR_SIZES].reverse().sort(compareSizes)).toEqual(CONDUCTOR_SIZES);
    CONDUCTOR_SIZES.forEach((size, index) => {
      expect(sizeIndex(size)).toBe(index);
      expect(isConductorSize(size)).toBe(true);
      expect(sizeForCircularMils(circularMils(size))).toBe(size);
      expect(circularMils(nextLargerSize(size) ?? "2000 kcmil")).toBeGreaterThan(index === CONDUCTOR_SIZES.length - 1 ? 0 : circularMils(size));
    });
    expect(sizeForCircularMils(211601)).toBe("250 kcmil");
    expect(() => sizeForCircularMils(2000001)).toThrow(QuantityError);
    expect(() => sizeForCircularMils(-1)).toThrow(QuantityError);
  });
  it.each([['1-1/4"', "1-1/4"], ["1 1/4", "1-1/4"], ["1.25", "1-1/4"], ["1¼", "1-1/4"], [2, "2"], ["3/4 in", "3/4"]])("trade size %j is %s", (text, size) => expect(parseTradeSize(text)).toBe(size));
  it("refuses other trade sizes and reads their number", () => {
    for (const value of ["7", "1-1/3", "", null, "1/0"]) expect(refusal(() => parseTradeSize(value)).field).toBe("tradeSize");
    expect([tradeSizeIn("1-1/4"), tradeSizeIn("3/8")]).toEqual([1.25, 0.375]);
  });
});

describe("system voltages", () => {
  it.each([["120/240 V", 240, 120, 1], ["240/120", 240, 120, 1], ["208Y/120 V", 208, 120, 3], ["480Y/277", 480, 277, 3], ["120/208", 208, 120, 3], ["240 V", 240, null, 1]] as const)("%s", (text, lineToLineV, lineToNeutralV, phases) => {
    expect(parseSystemVoltage(text)).toEqual({ lineToLineV, lineToNeutralV, phases });
    expect(parseSystemVoltage(formatSystemVoltage(parseSystemVoltage(text)))).toEqual({ lineToLineV, lineToNeutralV, phases });
  });
  it.each(["120/200 V", "0/0", "V", "", "9999 V", "208Y/100"])("refuses %s", (text) => expect(refusal(() => parseSystemVoltage(text, "systemVoltage")).field).toBe("systemVoltage"));
});

describe("print", () => {
  it("rounds for show only, half away from zero, with a real minus", () => {
    expect([roundForShow(2.675, 2), roundForShow(-0.125, 2), roundForShow(1e20, 2), roundForShow(-0.0001, 2)]).toEqual([2.68, -0.13, 1e20, 0]);
    expect([formatNumber(10400), formatNumber(-24), formatNumber(31.6666), formatNumber(0.5, 2, true), formatNumber(1234567.891, 1), formatNumber(-0.001)]).toEqual(["10,400", "−24", "31.67", "0.50", "1,234,567.9", "0"]);
    expect(formatQuantity(-24, "°C")).toBe("−24 °C");
    expect(() => formatNumber(Number.NaN)).toThrow(QuantityError);
  });
  it("writes inches as fractions", () => {
    expect([formatInches(1.25), formatInches(0.875), formatInches(2), formatInches(0.3), formatInches(0.0625)]).toEqual(['1-1/4"', '7/8"', '2"', '0.3"', '1/16"']);
    expect(() => formatInches(-1)).toThrow(QuantityError);
  });
});
