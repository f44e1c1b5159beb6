/** Runs tasks in the order in which they come, never more than `places` at once. */
export function createTurns(
  places: number,
): <Result>(task: () => Promise<Result>) => Promise<Result> {
  const waiting: (() => void)[] = [];
  let free = places;
  return async (task) => {
    if (free > 0) free -= 1;
    else await new Promise<void>((resolve) => waiting.push(resolve));
    try {
      return await task();
    } finally {
      // The place goes to the next in line; it is free only when nobody waits.
      const next = waiting.shift();
      if (next === undefined) free += 1;
      else next();
    }
  };
}
