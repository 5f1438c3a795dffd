/** Does work in a unit of work that is rolled back whatever it wrote, and answers what the work answered. */
export async function rolledBack<T>(
  inUnit: (work: () => Promise<never>) => Promise<never>,
  work: () => Promise<T>,
): Promise<T> {
  let result: { value: T } | undefined;
  const end = new Error('rolled back');
  try {
    await inUnit(async () => {
      result = { value: await work() };
      throw end;
    });
  } catch (error) {
    if (result === undefined) throw error;
  }
  return result!.value;
}
