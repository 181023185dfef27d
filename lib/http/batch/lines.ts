import type { ReadableStream } from "node:stream/web";

/** A line of a body, or the fact that it was longer than a line may be. */
export type Line = { text: string } | { tooLong: true };

/**
 * Cuts a stream of bytes into lines without holding more than one line and one chunk.
 * A line over the limit is passed over to its end, so that it does not take the next ones with it.
 */
export async function* linesOf(body: ReadableStream<Uint8Array>, maxCharacters: number): AsyncGenerator<Line[]> {
  let rest = "";
  let skipping = false;
  const decoder = new TextDecoder();
  for await (const bytes of body) {
    const parts = (rest + decoder.decode(bytes, { stream: true })).split("\n");
    rest = parts.pop()!;
    const lines: Line[] = [];
    for (const part of parts) {
      if (skipping || part.length > maxCharacters) lines.push({ tooLong: true });
      else if (part.trim() !== "") lines.push({ text: part });
      skipping = false;
    }
    if (rest.length > maxCharacters) {
      skipping = true;
      rest = "";
    }
    yield lines;
  }
  if (skipping) yield [{ tooLong: true }];
  else if (rest.trim() !== "") yield [{ text: rest }];
}
