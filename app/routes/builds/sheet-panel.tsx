import { useCallback, useMemo, useState, useSyncExternalStore } from "react";
import { Form } from "react-router";
import { FitStrip } from "~/components/drawings/fit-strip";
import { boxKey, type SheetBox } from "~/components/sheet/boxes";
import type { RowFigures } from "~/components/sheet/judgement";
import { ReadOut } from "~/components/sheet/read-out";
import { SheetGrid } from "~/components/sheet/sheet-grid";
import { type BoxState, SheetStore } from "~/components/sheet/sheet-store";
import { type SheetAnswer, useSender } from "~/components/sheet/use-sender";
import { Button } from "~/components/ui/button";
import { Choice } from "~/components/ui/choice";
import { Field } from "~/components/ui/field";
import { Select } from "~/components/ui/select";
import { diameterUnitName, type PageUnits } from "~/engineering/quantity/figures";
import { stationName } from "~/engineering/trade/fit-kinds";
import { expectedValue, readSheetBox, rowClearance, rowFigures } from "./sheet-figures";
import type { GaugeChoice, Sheet } from "./sheet-view.server";

interface SheetPanelProps {
  stage: "assembly" | "teardown";
  sheet: Sheet;
  boxes: [string, BoxState][];
  /** As-built values by box, on a teardown's sheet. */
  before?: Record<string, string>;
  /** As-built clearances, m, on a teardown's sheet. */
  asBuilt?: { positionId: string; clearance: number | undefined }[];
  units: PageUnits;
  gauges: GaugeChoice[];
  lastTemperature: string;
  lastGauges: { bore: string; journal: string };
  frozen: boolean;
  /** What the server answered to a form that was sent without script. */
  answers?: SheetAnswer["results"];
}

/** The reading grid of one fit with all that goes along with it. Without script it is a form with a button. */
export function SheetPanel(props: SheetPanelProps) {
  const { sheet, units, frozen, gauges } = props;
  const [store] = useState(() => new SheetStore(withRefused(props.boxes, props.answers)));
  const [session, setSession] = useState({
    fit: sheet.id,
    temperature: props.lastTemperature,
    boreGauge: props.lastGauges.bore,
    journalGauge: props.lastGauges.journal,
  });
  const [travel, setTravel] = useState<"position" | "station">("position");
  const [active, setActive] = useState<SheetBox | undefined>();
  const isScripted = useIsScripted();
  const { unreachable } = useSender(store, session);
  const version = useSyncExternalStore(store.subscribe, store.currentVersion, store.currentVersion);

  const judge = useMemo(() => {
    const temperature = Number.parseFloat(session.temperature.replace(",", "."));
    return {
      sheet,
      units,
      temperatureC: Number.isFinite(temperature) ? temperature : undefined,
      boreGauge: gauges.find((gauge) => gauge.id === session.boreGauge),
      journalGauge: gauges.find((gauge) => gauge.id === session.journalGauge),
    };
  }, [sheet, units, gauges, session]);

  const readBox = useCallback((box: SheetBox, text: string) => readSheetBox(judge, box, text), [judge]);
  const figures = useCallback(
    (row: readonly SheetBox[]): RowFigures => rowFigures(judge, row, (key) => store.box(key).valuePm),
    [judge, store],
  );
  const onActive = useCallback((box: SheetBox) => setActive(box), []);

  const clearances = sheet.positions.map((position) => {
    const measured = rowClearance(judge, position.id, (key) => store.box(key).valuePm)?.vertical;
    const built = props.asBuilt?.find((one) => one.positionId === position.id)?.clearance;
    const { number } = position;
    return props.stage === "assembly"
      ? { number, assembled: measured }
      : { number, assembled: built, tornDown: measured };
  });
  const boxes = sheet.positions.flatMap((position) => rowOf(sheet, position.id));
  const blank = boxes.filter((box) => store.box(box.key).text === "").length;
  const status = `${blank} of ${boxes.length} boxes to go. ${statusOf(store, unreachable, isScripted)}`;
  return (
    <section aria-label={`${sheet.name}, ${props.stage} sheet`}>
      <Form method="post" noValidate onSubmit={(event) => isScripted && event.preventDefault()}>
        <input type="hidden" name="fit" value={sheet.id} />
        {!frozen && (
          <div className="mb-4 flex flex-wrap items-end gap-4">
            <Field
              label="Parts at"
              suffix="°C"
              name="temperature"
              inputMode="decimal"
              defaultValue={session.temperature}
              onChange={(event) => setSession({ ...session, temperature: event.currentTarget.value })}
            />
            {(["bore", "journal"] as const).map((feature) => (
              <Select
                key={feature}
                label={`Gauge for the ${sheet[feature]}`}
                name={`${feature}Gauge`}
                defaultValue={session[`${feature}Gauge`]}
                onChange={(event) =>
                  setSession({ ...session, [`${feature}Gauge`]: event.currentTarget.value })
                }
                options={[
                  { value: "", label: "Not said" },
                  ...gauges.map(({ id, name }) => ({ value: id, label: name })),
                ]}
              />
            ))}
            {isScripted && (
              <Choice
                legend="Enter goes"
                name="travel"
                type="radio"
                options={[
                  { value: "position", label: "along a part" },
                  { value: "station", label: "through the parts" },
                ]}
                defaultValue={travel}
                onChange={(event) => setTravel(event.currentTarget.value as "position" | "station")}
              />
            )}
          </div>
        )}
        <ReadOut
          box={active}
          state={active && store.box(active.key)}
          title={active && `${sheet.position} ${active.position.number}`}
          expected={active && expectedValue(judge, active)}
          clearance={active && figures(rowOf(sheet, active))?.vertical}
          status={status}
          onUndo={isScripted && !frozen ? () => store.undo() : undefined}
        />
        <div className="overflow-x-auto">
          <SheetGrid
            label={`${sheet.name}, ${props.stage}`}
            positionWord={sheet.position}
            boreWord={sheet.bore}
            journalWord={sheet.journal}
            unitLabel={diameterUnitName(units)}
            positions={sheet.positions}
            stations={sheet.stations}
            store={store}
            travel={travel}
            frozen={frozen}
            before={props.before}
            readBox={readBox}
            figures={figures}
            onActive={onActive}
          />
        </div>
        {!isScripted && (
          <>
            {props.boxes.map(([key, box]) => (
              <span key={key}>
                <input type="hidden" name={`was.${key}`} value={box.text} />
                <input type="hidden" name={`id.${key}`} value={box.readingId ?? ""} />
              </span>
            ))}
            {!frozen && (
              <div className="mt-4">
                <Button type="submit">Save the sheet</Button>
              </div>
            )}
          </>
        )}
      </Form>
      <Troubles sheet={sheet} store={store} version={version} onFix={(key, text) => fix(key, text)} />
      <div className="mt-6">
        <FitStrip
          title={`${sheet.name}, as measured`}
          units={units}
          window={sheet.window}
          limits={sheet.limits}
          positions={clearances}
        />
      </div>
    </section>
  );

  function fix(key: string, text: string): void {
    const box = rowOf(sheet, key).find((candidate) => candidate.key === key);
    if (box) store.commit(key, { text, error: undefined, warning: undefined, ...readBox(box, text) });
  }
}

function rowOf(sheet: Sheet, active: SheetBox | string): SheetBox[] {
  const positionId = typeof active === "string" ? active.split(".")[0] : active.position.id;
  const position = sheet.positions.find((candidate) => candidate.id === positionId);
  return position
    ? sheet.stations.map((station) => ({ key: boxKey(position.id, station), position, station }))
    : [];
}

/** What was refused without script stands in its box again, with the reason. */
function withRefused(
  boxes: [string, BoxState][],
  answers: SheetAnswer["results"] = [],
): [string, BoxState][] {
  const states = new Map(boxes);
  for (const { key, readingId, refused } of answers) {
    if (refused)
      states.set(key, {
        text: refused.typed,
        error: refused.error,
        readingId,
        valuePm: null,
        status: "refused",
      });
  }
  return [...states];
}

function statusOf(store: SheetStore, unreachable: boolean, isScripted: boolean): string {
  if (!isScripted) return "Saved when you press the button";
  if (unreachable)
    return `The server cannot save just now: ${store.waiting} waiting, kept here and sent again`;
  return store.waiting > 0 ? `Saving ${store.waiting}` : "All saved";
}

/** False in the page as it arrives, true once script runs. */
function useIsScripted(): boolean {
  return useSyncExternalStore(
    () => () => {},
    () => true,
    () => false,
  );
}

interface TroublesProps {
  sheet: Sheet;
  store: SheetStore;
  version: number;
  onFix: (key: string, text: string) => void;
}

/** Every refusal and slip of the sheet as a sentence, each with what can be done about it. */
function Troubles({ sheet, store, onFix }: TroublesProps) {
  const troubled = sheet.positions
    .flatMap((position) => rowOf(sheet, position.id))
    .map((box) => ({ box, state: store.box(box.key) }))
    .filter(({ state }) => state.error || state.warning);
  return (
    <ul aria-live="polite" className="mt-3">
      {troubled.map(({ box, state }) => (
        <li key={box.key} className={`py-1 ${state.error ? "text-stop" : "text-watch"}`}>
          {sheet.position} {box.position.number}, {sheet[box.station.feature]} {stationName(box.station)}:{" "}
          {state.error ?? state.warning?.message}{" "}
          {!state.error && state.warning?.suggestion && (
            <button
              type="button"
              className="min-h-11 underline"
              onClick={() => onFix(box.key, state.warning?.suggestion as string)}
            >
              Make it {state.warning.suggestion}
            </button>
          )}
        </li>
      ))}
    </ul>
  );
}
