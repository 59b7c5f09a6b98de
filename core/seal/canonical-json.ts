/** Deeper values are refused: nothing that is signed comes near, and a hostile file must not exhaust the stack. */
const DEEPEST = 100;

const LONE_SURROGATE = /\p{Surrogate}/u;

/**
 * The canonical JSON text of a value by RFC 8785: no white space, members in the order of the UTF-16 code units of
 * their names, numbers and strings as ECMAScript writes them.
 *
 * Strict: what JSON cannot carry unchanged (`undefined`, functions, symbols, big integers, NaN and infinities, lone
 * surrogates, dates, maps and other class instances, sparse arrays) throws a TypeError that names the place, where
 * `JSON.stringify` would drop or alter it silently.
 */
export function canonicalJson(value: unknown): string {
  return write(value, '$', 0);
}

/** Whether a text of JSON is byte for byte the canonical form of what it says. */
export function isCanonical(text: string, parsed: unknown): boolean {
  try {
    return canonicalJson(parsed) === text;
  } catch (error) {
    if (error instanceof TypeError) return false;
    throw error;
  }
}

export function hasLoneSurrogate(text: string): boolean {
  return LONE_SURROGATE.test(text);
}

function write(value: unknown, place: string, depth: number): string {
  if (depth > DEEPEST) throw new TypeError(`${place} is nested deeper than ${DEEPEST} levels`);
  switch (typeof value) {
    case 'boolean':
      return value ? 'true' : 'false';
    case 'number':
      return writeNumber(value, place);
    case 'string':
      return writeString(value, place);
    case 'object':
      if (value === null) return 'null';
      return Array.isArray(value) ? writeArray(value, place, depth) : writeObject(value, place, depth);
    default:
      throw new TypeError(`${place} is ${typeof value}, which JSON cannot carry`);
  }
}

function writeNumber(value: number, place: string): string {
  if (!Number.isFinite(value)) throw new TypeError(`${place} is ${value}, which JSON cannot carry`);
  return JSON.stringify(value);
}

function writeString(value: string, place: string): string {
  if (hasLoneSurrogate(value)) throw new TypeError(`${place} holds a lone surrogate`);
  return JSON.stringify(value);
}

function writeArray(value: readonly unknown[], place: string, depth: number): string {
  // Own keys are the elements and `length`: fewer means holes, more means members that JSON would drop.
  if (Reflect.ownKeys(value).length !== value.length + 1) throw new TypeError(`${place} is not a plain array`);
  return `[${value.map((item, index) => write(item, `${place}[${index}]`, depth + 1)).join(',')}]`;
}

function writeObject(value: object, place: string, depth: number): string {
  if (!isPlain(value)) throw new TypeError(`${place} is not a plain object`);
  const members = value as Readonly<Record<string, unknown>>;
  const names = Reflect.ownKeys(value).map((name) => {
    if (typeof name === 'symbol') throw new TypeError(`${place} has a member named by a symbol`);
    return name;
  });
  // Array.prototype.sort without a comparison orders strings by UTF-16 code units, as RFC 8785 section 3.2.3 asks.
  const written = names.sort().map((name) => {
    const inside = `${place}.${name}`;
    return `${writeString(name, inside)}:${write(members[name], inside, depth + 1)}`;
  });
  return `{${written.join(',')}}`;
}

/** Plain: made by a literal or JSON.parse, in this realm or another; its prototype is null or has none itself. */
function isPlain(value: object): boolean {
  const prototype: unknown = Object.getPrototypeOf(value);
  return prototype === null || Object.getPrototypeOf(prototype) === null;
}
