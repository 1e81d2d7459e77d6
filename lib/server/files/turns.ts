/**
 * Lets at most `most` pieces of work run at a time, the others wait in order. Unpacking a picture takes a few hundred
 * megabytes, so that many at once would take the server down.
 */
export function turns(most: number): <Result>(work: () => Promise<Result>) => Promise<Result> {
  let running = 0;
  const waiting: (() => void)[] = [];
  return async (work) => {
    if (running >= most) await new Promise<void>((resolve) => waiting.push(resolve));
    else running += 1;
    try {
      return await work();
    } finally {
      const next = waiting.shift();
      if (next) next();
      else running -= 1;
    }
  };
}
