// Formulas of a record worked out again from the record alone, by a reader of formulas of its own: it imports nothing
// and shares no line with what made the record, so that it can run in a reader's browser as a second opinion.
// Grammar: sums of products of powers; a sign binds weaker than a power; powers from the right: -a^b^c = -(a^(b^c)).

/** What is read of an entry; entries of other kinds pass through unread. */
export interface RecheckedEntry {
  readonly kind: string;
  readonly id: string;
  readonly outOfDate?: boolean;
  readonly formula?: string;
  readonly inputs?: Readonly<Record<string, number>>;
  readonly value?: { readonly si: number };
  readonly passed?: boolean;
  readonly utilisation?: number;
  readonly closure?: boolean;
}

/** A formula that does not give what the record says. */
export interface FormulaFault {
  readonly id: string;
  readonly words: string;
}

export interface FormulaRecheck {
  /** Formulas worked out again. */
  readonly count: number;
  readonly faults: readonly FormulaFault[];
}

type Values = Readonly<Record<string, number>>;

/** Works every calculation and check out again from its formula and inputs, and compares each input with the value of
 *  the entry it names. Values agree to 1e-9 of their size. */
export function recheckFormulas(entries: readonly RecheckedEntry[]): FormulaRecheck {
  const values = new Map<string, number>();
  for (const { id, value } of entries) if (value !== undefined) values.set(id, value.si);
  const faults: FormulaFault[] = [];
  let count = 0;
  for (const entry of entries) {
    if (entry.formula === undefined || entry.closure === true) continue;
    if (entry.kind !== "calc" && entry.kind !== "check") continue;
    count++;
    for (const words of recheckOne(entry, values)) faults.push({ id: entry.id, words });
  }
  return { count, faults };
}

function recheckOne(entry: RecheckedEntry, values: ReadonlyMap<string, number>): string[] {
  const inputs = entry.inputs ?? {};
  const wrong = entry.outOfDate === true ? [] : inputFaults(inputs, values);
  try {
    wrong.push(...(entry.kind === "calc" ? calcFaults(entry, inputs) : checkFaults(entry, inputs)));
  } catch (error) {
    wrong.push(`"${entry.formula}": ${error instanceof Error ? error.message : String(error)}`);
  }
  return wrong;
}

function inputFaults(inputs: Values, values: ReadonlyMap<string, number>): string[] {
  return Object.keys(inputs).flatMap((name) => {
    const now = values.get(name);
    if (now === undefined) return [`${name} is not in the record`];
    return agree(now, inputs[name] ?? Number.NaN)
      ? []
      : [`used ${name} = ${inputs[name]}, the record says ${now}`];
  });
}

function calcFaults({ formula = "", value }: RecheckedEntry, inputs: Values): string[] {
  const at = formula.indexOf("=");
  const found = formulaValue(formula.slice(at + 1), inputs);
  const said = value?.si ?? Number.NaN;
  return agree(found, said) ? [] : [`"${formula}" gives ${found}, the record says ${said}`];
}

function checkFaults({ formula = "", passed, utilisation }: RecheckedEntry, inputs: Values): string[] {
  const parts = /^([^<>]*)(<=|>=|<|>)([^<>]*)$/.exec(formula);
  if (!parts) return [`"${formula}" is no comparison`];
  const sign = parts[2] ?? "";
  const [a, b] = [formulaValue(parts[1] ?? "", inputs), formulaValue(parts[3] ?? "", inputs)];
  const equal = Math.abs(a - b) <= 1e-12 * Math.max(Math.abs(a), Math.abs(b));
  const holds = equal ? sign.length === 2 : sign.startsWith("<") ? a < b : a > b;
  const wrong =
    holds === passed ? [] : [`"${formula}" ${holds ? "holds" : "does not hold"}, the record says otherwise`];
  const [less, more] = sign.startsWith("<") ? [a, b] : [b, a];
  const share = more > 0 ? less / more : undefined;
  if (share === undefined ? utilisation !== undefined : !agree(share, utilisation ?? Number.NaN))
    wrong.push(`"${formula}": utilisation ${share}, the record says ${utilisation}`);
  return wrong;
}

function agree(a: number, b: number): boolean {
  return a === b || Math.abs(a - b) <= 1e-9 * Math.max(Math.abs(a), Math.abs(b));
}

/** The value of a formula. Throws on a text that is none and on a symbol without a value. */
export function formulaValue(text: string, inputs: Values): number {
  const tokens = tokensOf(text);
  let at = 0;
  const next = (): string => tokens[at] ?? "";
  const take = (wanted: string): void => {
    if (next() !== wanted) throw new Error(`"${wanted}" is wanted before "${next()}"`);
    at++;
  };
  const sum = (): number => {
    let value = product();
    while (next() === "+" || next() === "-") value += tokens[at++] === "+" ? product() : -product();
    return value;
  };
  const product = (): number => {
    let value = signed();
    while (next() === "*" || next() === "/") {
      if (tokens[at++] === "*") value *= signed();
      else value /= signed();
    }
    return value;
  };
  const signed = (): number => {
    if (next() !== "-") return power();
    at++;
    return -signed();
  };
  const power = (): number => {
    const base = atom();
    if (next() !== "^") return base;
    at++;
    return base ** signed();
  };
  const list = (): number[] => {
    const values = [sum()];
    while (next() === ",") {
      at++;
      values.push(sum());
    }
    return values;
  };
  const atom = (): number => {
    const token = next();
    at++;
    if (token === "(") {
      const value = sum();
      take(")");
      return value;
    }
    if (/^[\d.]/.test(token)) return Number(token);
    if (!/^[A-Za-z]/.test(token)) throw new Error(`"${token}" stands where a value is wanted`);
    if (next() !== "(") return symbolValue(token, inputs);
    at++;
    const values = list();
    take(")");
    return called(token, values);
  };
  const value = sum();
  if (at < tokens.length) throw new Error(`"${next()}" is left over`);
  return value;
}

function tokensOf(text: string): string[] {
  const tokens: string[] = [];
  const pattern = /\s*(?:(\d+(?:\.\d*)?(?:e[+-]?\d+)?|\.\d+(?:e[+-]?\d+)?|[A-Za-z]\w*|[-+*/^(),])|(\S))/gy;
  for (const [, token, other] of text.matchAll(pattern)) {
    if (token === undefined) throw new Error(`"${other}" cannot stand in a formula`);
    tokens.push(token);
  }
  return tokens;
}

function symbolValue(name: string, inputs: Values): number {
  if (name === "pi") return Math.PI;
  if (!Object.hasOwn(inputs, name)) throw new Error(`${name} has no value`);
  return inputs[name] ?? Number.NaN;
}

function called(name: string, values: readonly number[]): number {
  const [x = Number.NaN] = values;
  switch (name) {
    case "sqrt":
      return Math.sqrt(x);
    case "abs":
      return Math.abs(x);
    case "min":
      return Math.min(...values);
    case "max":
      return Math.max(...values);
    case "sin":
      return Math.sin(x);
    case "cos":
      return Math.cos(x);
    case "tan":
      return Math.tan(x);
    case "asin":
      return Math.asin(x);
    case "acos":
      return Math.acos(x);
    case "atan":
      return Math.atan(x);
  }
  throw new Error(`"${name}" is no function of formulas`);
}
