/**
 * Size change of wood against published figures.
 *
 * Sources, each named again beside its check: Wood Handbook (FPL-GTR-190, 2010) Table 13-5 (coefficients), Tables 4-3 and 4-4 (total
 * shrinkage), Eq. 13-2 and 13-3, the worked example of p. 13-18; a flooring association's example.
 */
import { describe, expect, test } from "vitest";
import { coefficientAt, equilibriumMoisture, knownSpecies, type Species, strainAcross } from "@/lib/layout";
import { fromShrinkage } from "@/lib/layout/movement/size-change";

function species(name: string): Species {
  const found = knownSpecies.find((one) => one.name === name);
  if (!found) throw new Error(`no ${name} in the table`);
  return found;
}

/** Growth of a flat-sawn size across the grain. */
function growth(name: string, size: number, from: number, to: number): number {
  const strain = strainAcross(species(name).movement, 0, from, to);
  if (strain === null) throw new Error("above fibre saturation");
  return size * strain;
}

describe("Table 13-5 from Tables 4-3: C = 1/(30·100/S − 30 + 10) to five decimals", () => {
  // Those of single species whose shrinkage was read. "Commercial" oaks are averages of a group and are not among them.
  test.each([
    ["Alder, red", 4.4, 7.3],
    ["Ash, white", 4.9, 7.8],
    ["Aspen, quaking", 3.5, 6.7],
    ["Basswood, American", 6.6, 9.3],
    ["Beech, American", 5.5, 11.9],
    ["Birch, yellow", 7.3, 9.5],
    ["Birch, paper", 6.3, 8.6],
    ["Butternut", 3.4, 6.4],
    ["Cherry, black", 3.7, 7.1],
    ["Chestnut, American", 3.4, 6.7],
    ["Elm, American", 4.2, 9.5],
    ["Hackberry", 4.8, 8.9],
    ["Hickory, pecan", 4.9, 8.9],
    ["Oak, live", 6.6, 9.5],
    ["Oak, overcup", 5.3, 12.7],
    ["Sassafras", 4.0, 6.2],
    ["Sweetgum", 5.3, 10.2],
    ["Tupelo, black", 5.1, 8.7],
    ["Walnut, black", 5.5, 7.8],
    ["Fir, white", 3.3, 7.0],
  ])("%s: shrinkage %f and %f %%", (name, radial, tangential) => {
    const { movement } = species(name);
    if (movement.kind !== "coefficients") throw new Error("not from Table 13-5");
    expect(fromShrinkage(radial, 10)).toBeCloseTo(movement.radial, 5);
    expect(fromShrinkage(tangential, 10)).toBeCloseTo(movement.tangential, 5);
  });

  test("sycamore, 5.0 and 8.4 %: the table's tangential figure is one less in its last digit than the equation gives", () => {
    const { movement } = species("Sycamore, American");
    expect(fromShrinkage(5.0, 10)).toBeCloseTo(movement.radial, 5);
    expect(fromShrinkage(8.4, 10).toFixed(5)).toBe("0.00297");
    expect(movement.tangential).toBe(0.00296);
  });

  test("yellow-poplar, of which shrinkage was read: .00158 and .00289 at 10 %, as is common practice", () => {
    expect(coefficientAt(species("Yellow-poplar").movement, 90, 10)).toBeCloseTo(0.00158, 5);
    expect(coefficientAt(species("Yellow-poplar").movement, 0, 10)).toBeCloseTo(0.00289, 5);
  });

  test("Douglas-fir, of which shrinkage was read: .00267 tangential, as a flooring association lists it", () => {
    expect(coefficientAt(species("Douglas-fir, coast").movement, 0, 10)).toBeCloseTo(0.00267, 5);
  });
});

describe("worked examples by Eq. 13-2", () => {
  test("Wood Handbook p. 13-18: white fir, flat sawn, 232 mm (9.15 in) from 8 to 11 %: 0.067 in (1.7 mm), so 233.7 mm", () => {
    expect(growth("Fir, white", 9.15, 8, 11)).toBeCloseTo(0.067, 3);
    expect(growth("Fir, white", 232, 8, 11)).toBeCloseTo(1.7, 1);
    expect(232 + growth("Fir, white", 232, 8, 11)).toBeCloseTo(233.7, 1);
  });

  test("a flooring association: white oak 5 in wide from 6 to 9 %: 0.055 in", () => {
    expect(growth("Oak, white, commercial", 5, 6, 9)).toBeCloseTo(0.055, 3);
  });

  test("worked out independently: American beech, flat, 200 mm at 21 °C from 35 to 65 %: 4.33 mm", () => {
    const [dry, damp] = [35, 65].map((humidity) => equilibriumMoisture({ celsius: 21, humidity }));
    if (dry === undefined || damp === undefined) throw new Error("no moisture");
    expect(damp - dry).toBeCloseTo(5.018, 2);
    expect(growth("Beech, American", 200, dry, damp)).toBeCloseTo(4.33, 2);
  });
});

describe("Eq. 13-3", () => {
  test("takes green wood at 30 % to ovendry by its total shrinkage: yellow-poplar 8.2 % tangential, 4.6 % radial (Table 4-3)", () => {
    const { movement } = species("Yellow-poplar");
    expect(strainAcross(movement, 0, 30, 0)).toBeCloseTo(-0.082, 12);
    expect(strainAcross(movement, 90, 30, 0)).toBeCloseTo(-0.046, 12);
  });
});

test("every row of the table says where it is from, and no two rows share a key or a name", () => {
  expect(knownSpecies.filter(({ source }) => source.text === "")).toEqual([]);
  expect(new Set(knownSpecies.map(({ key }) => key)).size).toBe(knownSpecies.length);
  const names = knownSpecies.flatMap(({ name, alsoCalled }) => [name, ...alsoCalled]);
  expect(new Set(names).size).toBe(names.length);
});

test("wood moves more along its growth rings than out from the pith, in every species of the table", () => {
  for (const { name, movement } of knownSpecies) expect(movement.radial, name).toBeLessThan(movement.tangential);
});
