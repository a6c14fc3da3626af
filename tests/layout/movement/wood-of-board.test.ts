/** Which species a board's free text names, and what its wood is worked out with. */
import { describe, expect, test } from "vitest";
import { knownSpecies, matchSpecies, type Species, woodOfBoard } from "@/lib/layout";

const named = (text: string, species: readonly Species[] = knownSpecies) => {
  const match = matchSpecies(text, species);
  return match.kind === "found" ? match.species.name : match.candidates.map(({ name }) => name);
};

const own: Species = {
  key: "own",
  name: "Walnut, black",
  alsoCalled: ["Garden walnut"],
  movement: { kind: "coefficients", radial: 0.002, tangential: 0.003 },
  source: { kind: "shop", text: "Own test" },
};

describe("a board's species", () => {
  test.each([
    ["Walnut, black", "Walnut, black"],
    ["black walnut", "Walnut, black"],
    [" BLACK  WALNUT ", "Walnut, black"],
    ["American black walnut", "Walnut, black"],
    ["Hard maple", "Maple, sugar"],
    ["White oak", "Oak, white, commercial"],
    ["douglas fir", "Douglas-fir, coast"],
    ["yellow poplar", "Yellow-poplar"],
    ["Sapele", "Sapele"],
  ])("%s is %s", (text, name) => {
    expect(named(text)).toBe(name);
  });

  test("that several have is asked about, never guessed", () => {
    expect(named("Ash")).toEqual(["Ash, black", "Ash, green", "Ash, Oregon", "Ash, pumpkin", "Ash, white"]);
    expect(named("walnut")).toEqual(["Walnut, black"]);
    expect(named("European beech")).toEqual([]);
    expect(named("Pine")).toEqual([]);
    expect(named(" – ")).toEqual([]);
  });

  test("of the shop's own comes before one of the table", () => {
    const match = matchSpecies("black walnut", [own, ...knownSpecies]);
    expect(match).toMatchObject({ kind: "found", species: { key: "own" } });
  });
});

describe("the wood of a board", () => {
  const facts = { species: "Black walnut", cut: "rift" as const, moisture: 8.2 };

  test("is as its text, cut and reading say, unless the face chooses otherwise", () => {
    expect(woodOfBoard(facts, { species: null, ringAngle: null }, knownSpecies)).toMatchObject({
      species: { key: "walnut-black" },
      wood: { ringAngle: 45, moisture: 8.2, movement: { tangential: 0.00274 } },
    });
    expect(woodOfBoard(facts, { species: "cherry-black", ringAngle: 20 }, knownSpecies)).toMatchObject({
      species: { key: "cherry-black" },
      wood: { ringAngle: 20, movement: { tangential: 0.00248 } },
    });
  });

  test("whose chosen species is gone is as its text says again", () => {
    const chosen = { species: "own", ringAngle: null };
    expect(woodOfBoard(facts, chosen, knownSpecies)).toMatchObject({ species: { key: "walnut-black" } });
    expect(woodOfBoard({ ...facts, species: "Pine" }, chosen, knownSpecies)).toMatchObject({
      species: null,
      wood: { movement: null },
    });
  });
});
