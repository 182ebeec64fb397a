/**
 * Keeps the values of keys whose value never changes (an edition, a compiled line), at most `limit` of them, the least used
 * leaving first. Empty and failed reads are not kept. Several processes may each keep their own: a key means the same to all.
 */
export function keep<T>(limit: number, read: (key: string) => Promise<T | null>): (key: string) => Promise<T | null> {
  const kept = new Map<string, Promise<T | null>>();
  return (key) => {
    const found = kept.get(key);
    if (found !== undefined) {
      kept.delete(key);
      kept.set(key, found);
      return found;
    }
    const made = read(key);
    kept.set(key, made);
    const [oldest] = kept.keys();
    if (kept.size > limit && oldest !== undefined) kept.delete(oldest);
    const forget = (): void => {
      if (kept.get(key) === made) kept.delete(key);
    };
    made.then((value) => {
      if (value === null) forget();
    }, forget);
    return made;
  };
}
