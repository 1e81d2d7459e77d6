import { describe, expect, it } from "vitest";
import { REVISION_EVENTS, REVISION_STATES, nextLetter, nextState } from "@/lib/workflow";

describe("states of a revision", () => {
  it("move along the drafting office's way and no other", () => {
    const moves = REVISION_STATES.flatMap((state) => REVISION_EVENTS.flatMap((event) => {
      const next = nextState(state, event);
      return next === null ? [] : [`${state} -${event}-> ${next}`];
    }));
    expect(moves.sort()).toEqual([
      "in review -return-> returned",
      "in review -start seal-> sealing",
      "sealed -draft changed-> void",
      "sealed -supersede-> superseded",
      "sealing -finish seal-> sealed",
      "sealing -seal failed-> in review",
      "void -draft restored-> sealed",
      "void -supersede-> superseded",
    ]);
  });

  it("never lead out of what is over", () => {
    for (const state of ["returned", "superseded"] as const) expect(REVISION_EVENTS.map((event) => nextState(state, event))).toEqual(REVISION_EVENTS.map(() => null));
  });
});

describe("revision letters", () => {
  it("leave out I, O, Q, S, X and Z (common drafting practice, no published source)", () => {
    const letters: string[] = [];
    for (let last: string | null = null; letters.length < 22; last = letters.at(-1) ?? null) letters.push(nextLetter(last));
    expect(letters.join(" ")).toBe("A B C D E F G H J K L M N P R T U V W Y AA AB");
  });

  it("carry over as numbers do", () => {
    expect(nextLetter("AY")).toBe("BA");
    expect(nextLetter("YY")).toBe("AAA");
  });

  it.each(["", "I", "a", "A1", "ÄB"])("refuse %j", (letter) => {
    expect(() => nextLetter(letter)).toThrow(RangeError);
  });
});
