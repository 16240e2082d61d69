/** A logger's file for specs: jsdom's `File` has no stream, which every browser's has. */
export function fileOf(content: string | Uint8Array, name = 'log.csv', piece = 1000): File {
  const bytes = typeof content === 'string' ? new TextEncoder().encode(content) : content;
  const stream = (): ReadableStream<Uint8Array> => {
    let at = 0;
    return {
      getReader: () => ({
        read: () => {
          const value = bytes.subarray(at, at + piece);
          at += piece;
          return Promise.resolve(
            value.length === 0 ? { done: true, value: undefined } : { done: false, value },
          );
        },
      }),
    } as unknown as ReadableStream<Uint8Array>;
  };
  return { name, size: bytes.length, stream } as unknown as File;
}
