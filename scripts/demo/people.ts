/** The demo shop's people and how they sign in: invented. Data only, so that browser tests can use it. */

/** Told to whoever starts the demo; every one of them has the same password. */
export const demoPassword = "try-the-demo";
export const demoShopName = "Tarnholt Joinery";

export const demoPeople = [
  { role: "owner", name: "Ilse Varga", email: "owner@tarnholt.example" },
  { role: "maker", name: "Bram Okafor", email: "maker@tarnholt.example" },
  { role: "assistant", name: "Juno Pell", email: "assistant@tarnholt.example" },
] as const;
