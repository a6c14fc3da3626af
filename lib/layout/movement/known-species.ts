/**
 * Species whose movement is known, each row with where it is known from. Which figures are published and which are not:
 *
 * - `table13`: Wood Handbook (FPL-GTR-190, 2010), Table 13-5, coefficients for 6 to 14 % moisture, read there. Rows called
 *   "commercial" are averages of the group, not of one species.
 * - `table4`: total shrinkage from the Wood Handbook's Table 4-3 (grown in the USA) or 4-4 (imported), read there; used with Eq. 13-3.
 * - `practice`: common practice, no source. Where the imported woods' shrinkage is published as well, the figure that moves more is
 *   used and the other one named.
 *
 * European beech, oak, ash, maple, the pines and spruces are not in what was read: a shop enters its own with its source.
 */
import type { WoodMovement } from "./size-change";
import type { Species } from "./species";

const row = (name: string, alsoCalled: readonly string[], movement: WoodMovement, source: Species["source"]): Species => ({
  key: name.toLowerCase().replace(/[^a-z]+/g, "-"),
  name,
  alsoCalled,
  movement,
  source,
});

const table13 = (name: string, radial: number, tangential: number, ...alsoCalled: string[]) =>
  row(
    name,
    alsoCalled,
    { kind: "coefficients", radial, tangential },
    { kind: "published", text: "Wood Handbook FPL-GTR-190, Table 13-5" },
  );

const table4 = (table: "4-3" | "4-4", name: string, radial: number, tangential: number, ...alsoCalled: string[]) =>
  row(
    name,
    alsoCalled,
    { kind: "shrinkage", radial, tangential },
    {
      kind: "shrinkage",
      text: `Shrinkage ${radial} % radial, ${tangential} % tangential: Wood Handbook FPL-GTR-190, Table ${table}`,
    },
  );

const practice = (name: string, movement: WoodMovement, more: string, ...alsoCalled: string[]) =>
  row(name, alsoCalled, movement, { kind: "common-practice", text: `Common practice, no source${more}` });

/** In the order of their names. */
export const knownSpecies: readonly Species[] = [
  table4("4-4", "Afrormosia", 3.0, 6.4, "Kokrodua"),
  table13("Alder, red", 0.00151, 0.00256, "Alnus rubra"),
  table13("Apple", 0.00205, 0.00376),
  table13("Ash, black", 0.00172, 0.00274),
  table13("Ash, green", 0.00169, 0.00274),
  table13("Ash, Oregon", 0.00141, 0.00285),
  table13("Ash, pumpkin", 0.00126, 0.00219),
  table13("Ash, white", 0.00169, 0.00274, "American ash", "American white ash", "Fraxinus americana"),
  table13("Aspen, quaking", 0.00119, 0.00234, "American aspen"),
  table13("Basswood, American", 0.0023, 0.0033, "Basswood"),
  table13("Beech, American", 0.0019, 0.00431, "Fagus grandifolia"),
  table13("Birch, paper", 0.00219, 0.00304),
  table13("Birch, river", 0.00162, 0.00327),
  table13("Birch, sweet", 0.00256, 0.00338),
  table13("Birch, yellow", 0.00256, 0.00338),
  table13("Buckeye, yellow", 0.00123, 0.00285),
  table13("Butternut", 0.00116, 0.00223, "Juglans cinerea"),
  table13("Catalpa, northern", 0.00085, 0.00169),
  practice("Cedar, Spanish", { kind: "coefficients", radial: 0.00141, tangential: 0.00219 }, "", "Cedrela"),
  table4("4-3", "Cedar, western red", 2.4, 5.0, "Western redcedar", "Thuja plicata"),
  table13("Cherry, black", 0.00126, 0.00248, "American cherry", "American black cherry", "Prunus serotina"),
  table13("Chestnut, American", 0.00116, 0.00234),
  table13("Cottonwood, black", 0.00123, 0.00304),
  table13("Cottonwood, eastern", 0.00133, 0.00327),
  table4("4-3", "Douglas-fir, coast", 4.8, 7.6, "Douglas fir"),
  table13("Elm, American", 0.00144, 0.00338, "White elm"),
  table13("Elm, cedar", 0.00183, 0.00419),
  table13("Elm, rock", 0.00165, 0.00285),
  table13("Elm, slippery", 0.00169, 0.00315, "Red elm"),
  table13("Elm, winged", 0.00183, 0.00419),
  row(
    "Fir, white",
    [],
    { kind: "coefficients", radial: 0.00112, tangential: 0.00245 },
    {
      kind: "secondary",
      text: "Wood Handbook FPL-GTR-190, p. 13-18: radial as printed, tangential as its worked example implies",
    },
  ),
  table13("Hackberry", 0.00165, 0.00315),
  table13("Hickory, pecan", 0.00169, 0.00315, "Pecan"),
  table13("Honeylocust", 0.00144, 0.0023, "Honey locust"),
  practice("Iroko", { kind: "coefficients", radial: 0.00153, tangential: 0.00205 }, ""),
  practice(
    "Khaya",
    { kind: "coefficients", radial: 0.00141, tangential: 0.00201 },
    "; its published shrinkage of 2.5/4.5 % would move less",
    "African mahogany",
  ),
  table4("4-4", "Limba", 4.5, 6.2, "Frake"),
  table13("Locust, black", 0.00158, 0.00252, "Robinia pseudoacacia"),
  table13("Madrone, Pacific", 0.00194, 0.00451, "Madrone"),
  table13("Magnolia, cucumbertree", 0.0018, 0.00312, "Cucumbertree"),
  table13("Magnolia, southern", 0.00187, 0.0023),
  table13("Magnolia, sweetbay", 0.00162, 0.00293),
  practice(
    "Mahogany, true",
    { kind: "coefficients", radial: 0.00172, tangential: 0.00238 },
    "; its published shrinkage of 3.0/4.1 % would move less",
    "Swietenia",
    "Honduran mahogany",
  ),
  table13("Maple, bigleaf", 0.00126, 0.00248),
  table13("Maple, black", 0.00165, 0.00353),
  table13("Maple, red", 0.00137, 0.00289, "Soft maple, red"),
  table13("Maple, silver", 0.00102, 0.00252, "Soft maple, silver"),
  table13("Maple, sugar", 0.00165, 0.00353, "Hard maple", "Rock maple", "Acer saccharum"),
  table4("4-3", "Oak, chestnut", 5.3, 10.8),
  table13("Oak, live", 0.0023, 0.00338),
  table13("Oak, Oregon white", 0.00144, 0.00327),
  table13("Oak, overcup", 0.00183, 0.00462),
  table4("4-3", "Oak, post", 5.4, 9.8),
  table13("Oak, red, commercial", 0.00158, 0.00369, "Red oak", "American red oak"),
  table13("Oak, red: water, laurel, willow", 0.00151, 0.0035, "Water oak", "Laurel oak", "Willow oak"),
  table13("Oak, white, commercial", 0.0018, 0.00365, "White oak", "American white oak"),
  practice("Okoume", { kind: "coefficients", radial: 0.00194, tangential: 0.00212 }, "", "Gaboon"),
  table13("Persimmon, common", 0.00278, 0.00403, "Persimmon"),
  practice("Sapele", { kind: "shrinkage", radial: 4.6, tangential: 7.4 }, ""),
  table13("Sassafras", 0.00137, 0.00216),
  table13("Sweetgum", 0.00183, 0.00365, "Red gum"),
  table13("Sycamore, American", 0.00172, 0.00296),
  table13("Tanoak", 0.00169, 0.00423),
  practice(
    "Teak",
    { kind: "coefficients", radial: 0.00101, tangential: 0.00186 },
    " for radial; tangential .00186 from two flooring associations' lists",
    "Tectona grandis",
  ),
  table13("Tupelo, black", 0.00176, 0.00308),
  table13("Tupelo, water", 0.00144, 0.00267),
  table13("Walnut, black", 0.0019, 0.00274, "American walnut", "American black walnut", "Juglans nigra"),
  table4(
    "4-3",
    "Yellow-poplar",
    4.6,
    8.2,
    "Tulipwood",
    "Tulip poplar",
    "Tulip tree",
    "American tulipwood",
    "Liriodendron tulipifera",
  ),
];
