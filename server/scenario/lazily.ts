// Records with fields that are worked out when somebody first reads them: most workings and moved figures are never looked
// at. Invariant: a field once read keeps its value, and reads like any other from then on.

/** The record with some of its fields worked out when they are first read. */
export function lazily<Of extends object>(value: Of, fields: { readonly [Key in keyof Of]?: () => Of[Key] }): Of {
  for (const [key, workOut] of Object.entries<(() => unknown) | undefined>(fields)) {
    Object.defineProperty(value, key, {
      enumerable: true,
      configurable: true,
      get() {
        const found = workOut?.();
        Object.defineProperty(value, key, { value: found, enumerable: true });
        return found;
      },
    });
  }
  return value;
}
