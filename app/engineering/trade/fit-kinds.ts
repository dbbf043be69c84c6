/** One place a reading is taken: which plane along the bore or journal, and which axis across it. */
export interface Station {
  feature: "bore" | "journal";
  plane: "front" | "middle" | "rear";
  axis: "vertical" | "plus45" | "minus45" | "horizontal" | "a" | "b";
}

/** A kind of running fit: its words, and where a builder measures it. */
export interface FitKind {
  kind: string;
  /** The fit as a heading: "Big ends". */
  name: string;
  /** One of its places, before the number: "Big end". */
  position: string;
  bore: string;
  journal: string;
  stations: readonly Station[];
}

type Plane = Station["plane"];
type Axis = Station["axis"];

const grid = (feature: Station["feature"], planes: readonly Plane[], axes: readonly Axis[]): Station[] =>
  planes.flatMap((plane) => axes.map((axis) => ({ feature, plane, axis })));

// Shell bearings: 90° to the parting line is the reading of record, 45° either side shows shape near the joint,
// two depths show taper; journals in two directions 90° apart at each end (common practice, handbooks agree).
const shellBearing = [
  ...grid("bore", ["front", "rear"], ["vertical", "plus45", "minus45"]),
  ...grid("journal", ["front", "rear"], ["a", "b"]),
];

// Wrist pins: bosses and eye in two directions at two depths, the pin likewise (maker's bulletins, eight readings).
const pin = [
  ...grid("bore", ["front", "rear"], ["vertical", "horizontal"]),
  ...grid("journal", ["front", "rear"], ["a", "b"]),
];

// Valves: guide at three heights in two directions, stem at three heights (handbook practice: guides wear bell-mouthed).
const stem = [
  ...grid("bore", ["front", "middle", "rear"], ["a", "b"]),
  ...grid("journal", ["front", "middle", "rear"], ["a"]),
];

/** The kinds of running fit, in the order their parts lie on the bench. */
export const fitKinds = [
  { kind: "main", name: "Mains", position: "Main", bore: "bore", journal: "journal", stations: shellBearing },
  {
    kind: "big-end",
    name: "Big ends",
    position: "Big end",
    bore: "bore",
    journal: "journal",
    stations: shellBearing,
  },
  {
    kind: "pin-in-piston",
    name: "Wrist pins in pistons",
    position: "Pin in piston",
    bore: "boss",
    journal: "pin",
    stations: pin,
  },
  {
    kind: "pin-in-rod",
    name: "Wrist pins in rods",
    position: "Pin in rod",
    bore: "eye",
    journal: "pin",
    stations: pin,
  },
  {
    kind: "intake-stem",
    name: "Intake valve stems",
    position: "Intake",
    bore: "guide",
    journal: "stem",
    stations: stem,
  },
  {
    kind: "exhaust-stem",
    name: "Exhaust valve stems",
    position: "Exhaust",
    bore: "guide",
    journal: "stem",
    stations: stem,
  },
  {
    kind: "piston-in-bore",
    name: "Pistons in bores",
    position: "Piston",
    bore: "bore",
    journal: "piston",
    stations: [...grid("bore", ["front", "middle", "rear"], ["a", "b"]), ...grid("journal", ["rear"], ["a"])],
  },
  {
    kind: "cam-bearing",
    name: "Cam bearings",
    position: "Cam bearing",
    bore: "bore",
    journal: "journal",
    stations: [
      ...grid("bore", ["front", "rear"], ["vertical", "horizontal"]),
      ...grid("journal", ["front", "rear"], ["a", "b"]),
    ],
  },
] as const satisfies readonly FitKind[];

export type FitKindName = (typeof fitKinds)[number]["kind"];

/** The kinds by their names, for checking what comes in. */
export const fitKindNames = fitKinds.map((fit) => fit.kind) as [FitKindName, ...FitKindName[]];

/** The words and stations of a kind; a kind is checked when it is stored, so this always finds one. */
export function fitKind(kind: string): FitKind {
  const found: FitKind | undefined = fitKinds.find((fit) => fit.kind === kind);
  if (!found) throw new RangeError(`no fit kind is called ${kind}`);
  return found;
}

const planeWords: Record<Plane, string> = { front: "front", middle: "middle", rear: "rear" };
const axisWords: Record<Axis, string> = {
  vertical: "90°",
  plus45: "+45°",
  minus45: "−45°",
  horizontal: "0°",
  a: "A",
  b: "B",
};

/** A station's column head: "front 90°", "rear A". Vertical is 90° to the parting line. */
export function stationName(station: Pick<Station, "plane" | "axis">): string {
  return `${planeWords[station.plane]} ${axisWords[station.axis]}`;
}
