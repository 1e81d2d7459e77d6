import { describe, expect, it } from "vitest";
import { dueWords } from "@/components/jobs/Due";
import { centsOf, dollarsOf, officeChange, officeForm } from "@/components/jobs/officeForm";
import { EVERYTHING, askedBy, choiceOf, unusual } from "@/components/jobs/useJobsChoice";

describe("a fee as it is typed", () => {
  it.each([
    ["412.50", 41250], ["412.5", 41250], ["412.", 41200], ["412", 41200], ["$1,234.50", 123450], [" $ 12 ", 1200], ["1,234,567", 123456700], [".75", 75], ["0", 0], ["", null],
    // In binary, 1.1 × 100 and 8.2 × 100 are no whole numbers.
    ["1.10", 110], ["8.20", 820],
  ])("%s is %s cents", (typed, cents) => expect(centsOf(typed)).toEqual({ cents }));
  it.each(["12.345", "1,23", "12,3456", "-5", "abc", "$", ".", "1 000", "1e3", "412,50"])("%s is no amount", (typed) => expect(centsOf(typed)).toEqual({ fault: expect.stringMatching(/^takes/) }));
  it("knows a largest fee", () => expect(centsOf("100,000,000.01")).toEqual({ fault: expect.stringMatching(/^is larger/) }));
  it.each([[123450, "1,234.50"], [75, "0.75"], [0, "0.00"], [null, ""]])("%s cents are shown as %s", (cents, shown) => expect(dollarsOf(cents)).toBe(shown));
});

describe("the office's form", () => {
  const filled = { dueOn: "2027-01-15", officeStatus: "on hold", permitFeeCents: "$10", permitFeePaidOn: "", permitReceipt: " R-1 " } as const;
  it("sends what was touched alone", () => {
    const read = officeForm.parse(filled);
    expect(read).toEqual({ dueOn: "2027-01-15", officeStatus: "on hold", permitFeeCents: 1000, permitFeePaidOn: null, permitReceipt: "R-1" });
    expect(officeChange(read, { permitFeeCents: true, permitFeePaidOn: true })).toEqual({ permitFeeCents: 1000, permitFeePaidOn: null });
  });
  it.each([["dueOn", "soon"], ["permitFeeCents", "ten"], ["officeStatus", "lost"]])("names a wrong %s", (field, value) => {
    expect(officeForm.safeParse({ ...filled, [field]: value }).error?.issues.map((issue) => issue.path[0])).toEqual([field]);
  });
});

describe("days to a due date", () => {
  it.each([[-7, "7 days late"], [-1, "1 day late"], [0, "due today"], [1, "in 1 day"], [14, "in 14 days"], [15, null]])("%s: %s", (left, words) => expect(dueWords(left)).toBe(words));
});

describe("the register's choice", () => {
  it("is read from an address and leaves the usual out", () => {
    const choice = choiceOf(new URLSearchParams("q=mill&due=late&status=on+hold&sort=due"));
    expect(choice).toEqual({ ...EVERYTHING, q: "mill", due: "late", status: "on hold", sort: "due" });
    expect(unusual(choice)).toEqual({ q: "mill", due: "late", status: "on hold", sort: "due" });
    expect(unusual(EVERYTHING)).toEqual({});
  });
  it("takes nothing from an address that it does not know", () => {
    expect(choiceOf(new URLSearchParams(`tab=secret&due=1&jurisdiction=x'y&archived=maybe&sort=password&q=${"x".repeat(200)}`))).toEqual({ ...EVERYTHING, q: "x".repeat(120) });
  });
  it("asks what is late by the person's own day", () => {
    expect(askedBy({ ...EVERYTHING, due: "late" })).toEqual({ due: "late", today: expect.stringMatching(/^\d{4}-\d\d-\d\d$/) });
    expect(askedBy({ ...EVERYTHING, q: "  " })).toEqual({});
  });
});
