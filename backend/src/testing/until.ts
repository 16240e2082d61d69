/** Looks again and again until something is there; fails loudly when it never comes. */
export async function until<T>(look: () => Promise<T | undefined | null | false>, ms = 15_000): Promise<T> {
  const end = Date.now() + ms;
  for (;;) {
    const found = await look();
    if (found) return found;
    if (Date.now() > end) throw new Error('It did not come about in time');
    await new Promise((resolve) => setTimeout(resolve, 60));
  }
}
