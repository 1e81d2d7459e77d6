import { describe, expect, it } from "vitest";
import { DEFAULT_FILE_NAME, FILE_NAME_CHARACTERS, fileName, sampleFileName, templateFault } from "@/lib/sheets/fileName";

const values = { job: "26-031", set: "SET", revision: "B", sheet: "E-601", date: "2026-04-23" };

describe("a file-name template", () => {
  it.each([
    [DEFAULT_FILE_NAME, "26-031-SET-B.pdf"],
    ["{job} {set} Rev {revision} {date}", "26-031-SET-Rev-B-2026-04-23.pdf"],
    ["C1_{job}_{sheet}", "C1_26-031_E-601.pdf"],
    ["{job}{job}", "26-03126-031.pdf"],
  ])("%s gives %s", (template, name) => {
    expect(fileName(template, values)).toBe(name);
    expect(sampleFileName(template).replace("2026-12-01", "2026-04-23")).toBe(name);
  });

  it.each<[string, "one file" | "one file a sheet", string | null]>([
    ["{job}", "one file", null],
    ["Plans {revision}", "one file", null],
    ["{job}-{sheet}", "one file a sheet", null],
    ["", "one file", "is missing"],
    ["Plans", "one file", "needs {job} or {revision}"],
    ["{job}", "one file a sheet", "needs {sheet}"],
    ["{job}-{owner}", "one file", "knows no {owner}"],
    ["{job}-{constructor}", "one file", "knows no {constructor}"],
    ["{job}-{}", "one file", "knows no {}"],
    ["{job}{", "one file", "not {"],
    ["../{job}", "one file", "not ."],
    ["{job}/{set}", "one file", "not /"],
    ['{job}"', "one file", 'not "'],
  ])("%s with %s: %s", (template, split, fault) => {
    if (fault === null) expect(templateFault(template, split)).toBeNull();
    else expect(templateFault(template, split)).toContain(fault);
  });

  it("leaves nothing of a job number that a file system or a header would read as its own", () => {
    for (const job of ["../../etc/passwd", 'a"b\r\nc', "26/031 (east)", "Ünïcode", "{set}", "a".repeat(400)]) {
      const name = fileName("{job}-{set}-{revision}", { ...values, job });
      expect(name).toMatch(/^[A-Za-z0-9_-]+\.pdf$/);
      expect(name.length).toBeLessThanOrEqual(FILE_NAME_CHARACTERS + 4);
    }
    expect(fileName("{job}-{set}", { ...values, job: "///" })).toBe("job-SET.pdf");
    expect(fileName("{job}-{set}", { ...values, job: "{set}" })).toBe("set-SET.pdf");
  });
});
