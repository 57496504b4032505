// Records with fields that are worked out when somebody first reads them: most workings and moved figures are never looked
// at. The getter of a field is one for all records, so that records with the same fields have the same shape, and what a
// field is worked out by goes once it has been. Invariant: a field once read keeps its value, and reads like any other
// from then on.

type WorkOut = () => unknown;

/** The record with some of its fields worked out when they are first read. `fields` is taken over. */
export function lazily<Of extends object>(value: Of, fields: { readonly [Key in keyof Of]?: () => Of[Key] }): Of {
  Object.defineProperty(value, UNREAD, { value: fields });
  for (const key of Object.keys(fields)) Object.defineProperty(value, key, fieldOf(key));
  return value;
}

/** Whether the field was left to be worked out when it is first read, whether that has happened or not. */
export function isPutOff<Of extends object>(value: Of, key: keyof Of): boolean {
  const unread: unknown = Reflect.get(value, UNREAD);
  return typeof unread === 'object' && unread !== null && key in unread;
}

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
