import { EngineeringError } from "~/engineering/engineering-error";
import type { QuantityKind, UnitName } from "~/engineering/quantity/units";
import type { FieldError } from "~/models/refusal";
import { evaluateQuantity } from "~/services/quantity-expression.server";

/** A calculator's field: what it is of, and the unit that a bare number has. */
export interface QuantityField {
  kind: QuantityKind;
  unit: UnitName;
}

/** The fields of a calculator as its address gives them: each read by itself, what cannot be read named at its field. */
export class AskedFields {
  readonly typed: Record<string, string>;
  readonly errors: FieldError[] = [];

  constructor(asked: URLSearchParams) {
    this.typed = Object.fromEntries(asked);
  }

  /** True where nothing is asked yet: the page then only shows its form. */
  get isEmpty(): boolean {
    return Object.values(this.typed).every((text) => text.trim() === "");
  }

  /** A quantity or a sum of them, in the core's units; undefined where the field is blank or cannot be read. */
  async quantity(name: string, { kind, unit }: QuantityField): Promise<number | undefined> {
    const text = this.typed[name]?.trim() ?? "";
    if (text === "") return undefined;
    try {
      return (await evaluateQuantity(text, kind, { defaultUnit: unit })).si;
    } catch (error) {
      this.note(error, name);
      return undefined;
    }
  }

  /** The same where the calculator cannot go without. */
  async required(name: string, field: QuantityField): Promise<number> {
    const value = await this.quantity(name, field);
    if (value === undefined && !this.errors.some((error) => error.path === name)) {
      this.errors.push({ path: name, code: "missing", message: "Type a value." });
    }
    return value ?? Number.NaN;
  }

  /** A plain number, comma or point. */
  number(name: string): number | undefined {
    const text = this.typed[name]?.trim() ?? "";
    if (text === "") return undefined;
    if (/^[+-]?\d+([.,]\d+)?$/.test(text)) return Number(text.replace(",", "."));
    this.errors.push({ path: name, code: "not-a-number", message: "Type a number." });
    return undefined;
  }

  /** The work of a calculator, once every field could be read; what the core refuses stands at its field. */
  result<Result>(
    work: () => Result,
    nameOf: (field: string) => string = (field) => field,
  ): Result | undefined {
    if (this.errors.length > 0) return undefined;
    try {
      return work();
    } catch (error) {
      this.note(error, error instanceof EngineeringError ? nameOf(error.field) : "");
      return undefined;
    }
  }

  private note(error: unknown, path: string): void {
    if (!(error instanceof EngineeringError)) throw error;
    this.errors.push({ path, code: error.code, message: error.message });
  }
}
