/** Ends an exhaustive `switch`: a case that was forgotten does not compile. Throws if one slips through at run time. */
export function assertNever(value: never): never {
  throw new Error(`Unexpected value: ${JSON.stringify(value)}`);
}
