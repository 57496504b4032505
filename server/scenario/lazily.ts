// Records with fields that are worked out when somebody first reads them: most workings and moved figures are never looked
// at. The getter of a field is one for all records, so that records with the same fields have the same shape, and what a
// field is worked out by goes once it has been. Invariants: a field once read keeps its value, and reads like any other
// from then on; asking whether a field is worked out works nothing out.

type WorkOut = () => unknown;

/** The record with some of its fields worked out when they are first read. `fields` is taken over. */
export function lazily<Of extends object>(value: Of, fields: { readonly [Key in keyof Of]?: () => Of[Key] }): Of {
  Object.defineProperty(value, UNREAD, { value: fields });
  for (const key of Object.keys(fields)) Object.defineProperty(value, key, fieldOf(key));
  return value;
}

/** The same for a record whose fields only hand on those of another: what is worked out there is worked out here. */
export function lazilyFrom<Of extends object>(
  source: object,
  value: Of,
  fields: { readonly [Key in keyof Of]?: () => Of[Key] },
): Of {
  sources.set(value, source);
  return lazily(value, fields);
}

/** Whether reading the field works nothing out. */
export function isWorkedOut<Of extends object>(value: Of, key: keyof Of): boolean {
  for (let record: object | undefined = value; record; record = sources.get(record)) {
    const field = Object.getOwnPropertyDescriptor(record, key);
    if (field && 'value' in field) return true;
  }
  return false;
}

const sources = new WeakMap<object, object>();

/** What the fields not read yet are worked out by, in the record itself, where nobody who lists its fields sees it. */
const UNREAD = Symbol('unread');

const known = new Map<string, PropertyDescriptor>();

function fieldOf(key: string): PropertyDescriptor {
  const made = known.get(key) ?? makeField(key);
  known.set(key, made);
  return made;
}

function makeField(key: string): PropertyDescriptor {
  return {
    enumerable: true,
    configurable: true,
    get(this: { readonly [UNREAD]: Record<string, WorkOut | undefined> }) {
      const found = this[UNREAD][key]?.();
      this[UNREAD][key] = undefined;
      Object.defineProperty(this, key, { value: found, enumerable: true });
      return found;
    },
  };
}
