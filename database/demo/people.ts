/** The demo's password: shown on its sign-in page and printed at start, since nothing in the demo is real. */
export const demoPassword = "bench-and-bore";

/** Who can sign in to the demo, and what to try as them. */
export const demoSignIns = [
  { email: "owner@example.test", role: "owner", name: "Odile Ferrand", what: "runs the shop" },
  {
    email: "builder@example.test",
    role: "builder",
    name: "Bram Oyelaran",
    what: "types readings, tears down",
  },
  { email: "chief@example.test", role: "crew-chief", name: "Cass Lindqvist", what: "reviews and signs" },
  { email: "tuner@example.test", role: "tuner", name: "Tove Marchetti", what: "keeps oils and the run log" },
  { email: "viewer@example.test", role: "viewer", name: "Vik Sandoval", what: "an engine's customer" },
  { email: "other@example.test", role: "owner", name: "Orla Bekele", what: "owner of a second shop" },
] as const;
