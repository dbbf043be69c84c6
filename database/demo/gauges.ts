import type { Feature } from "#database/schema";

/** The two sets of gauges on the demo's bench; an engine is measured with one of them throughout. */
export type GaugeSet = "inch" | "metric";

/** A gauge as its person typed it in, and what it is used for. */
export interface DemoGauge {
  name: string;
  kind: "micrometer" | "bore gauge" | "small-hole gauge";
  serial: string;
  resolution: string;
  calibration: string;
  repeatability: string;
  dueInDays: number;
  set: GaugeSet;
  feature: Feature;
  parts: "crank" | "small";
}

const inch = {
  resolution: "0.00005 in",
  calibration: "0.00002 in",
  repeatability: "0.00003 in",
  set: "inch",
} as const;

const metric = { calibration: "0.0005 mm", repeatability: "0.0007 mm", set: "metric" } as const;

/** The demo's gauges: half-tenths in inches, a micron and half a micron in millimetres. */
export const demoGauges: readonly DemoGauge[] = [
  {
    ...inch,
    name: "Dial bore gauge, 2 to 3 in",
    kind: "bore gauge",
    serial: "BG-07",
    dueInDays: 96,
    feature: "bore",
    parts: "crank",
  },
  {
    ...inch,
    name: "Micrometer, 2 to 3 in",
    kind: "micrometer",
    serial: "M-23",
    dueInDays: 96,
    feature: "journal",
    parts: "crank",
  },
  {
    ...inch,
    name: "Small-hole gauge, 0.2 to 1 in",
    kind: "small-hole gauge",
    serial: "SH-02",
    dueInDays: 40,
    feature: "bore",
    parts: "small",
  },
  {
    ...inch,
    name: "Micrometer, 0 to 1 in",
    kind: "micrometer",
    serial: "M-11",
    dueInDays: 12,
    feature: "journal",
    parts: "small",
  },
  {
    ...metric,
    name: "Bore gauge, 50 to 75 mm",
    kind: "bore gauge",
    serial: "BG-12",
    resolution: "0.001 mm",
    dueInDays: 151,
    feature: "bore",
    parts: "crank",
  },
  {
    ...metric,
    name: "Micrometer, 50 to 75 mm",
    kind: "micrometer",
    serial: "M-57",
    resolution: "0.001 mm",
    dueInDays: 151,
    feature: "journal",
    parts: "crank",
  },
  {
    ...metric,
    name: "Small-hole gauge, 6 to 25 mm",
    kind: "small-hole gauge",
    serial: "SH-05",
    resolution: "0.0005 mm",
    dueInDays: 151,
    feature: "bore",
    parts: "small",
  },
  {
    ...metric,
    name: "Micrometer, 0 to 25 mm",
    kind: "micrometer",
    serial: "M-52",
    resolution: "0.0005 mm",
    dueInDays: 151,
    feature: "journal",
    parts: "small",
  },
];
