import type { ReadableStream as NodeReadableStream } from "node:stream/web";
import { setImmediate } from "node:timers/promises";
import { MOST_BATCH_LINES, batch } from "@/api-spec/calculations/batch";
import { spendItems } from "@/lib/limits/planLimits";
import { type Problem, refusal } from "@/lib/problems/problem";
import { DEFAULT_BODY_LIMIT } from "../requestBody";
import { endPassage, withHeaders, type Passage } from "../passage";
import { linesOf, type Line } from "./lines";
import { failedItem, runItem, type ItemResult } from "./runItem";

/**
 * Answers a batch line by line while its lines arrive. The reader of the answer sets the pace: no more is read
 * than has been taken, so a hundred thousand lines need no more memory than one chunk of them.
 */
export function streamedBatch(request: Request, passage: Passage): Response {
  const chunks = request.body ? linesOf(request.body as NodeReadableStream<Uint8Array>, DEFAULT_BODY_LIMIT) : emptyLines();
  let index = 0;
  passage.items = 0;
  const end = (): void => endPassage(batch, passage, 200, null);

  const stream = new ReadableStream<Uint8Array>({
    async pull(controller) {
      // A pull that gives nothing is not repeated, so it goes on until a chunk held the end of a line.
      let given = false;
      while (!given) {
        // Lines that have arrived already would otherwise be run in one go, and nobody else be answered meanwhile.
        await setImmediate();
        const { value: lines, done } = await chunks.next();
        if (done) {
          end();
          controller.close();
          return;
        }
        const allowed = lines.slice(0, Math.max(0, MOST_BATCH_LINES - index));
        const results = await runLines(allowed, index, passage);
        index += allowed.length;
        passage.items += allowed.length;
        const tooMany = allowed.length < lines.length;
        if (tooMany) results.push(failedItem(tooManyLines(), index, passage.requestId, ""));
        if (results.length > 0) controller.enqueue(Buffer.from(results.map((result) => `${JSON.stringify(result)}\n`).join("")));
        given = results.length > 0;
        if (tooMany) {
          end();
          controller.close();
          await chunks.return(undefined);
        }
      }
    },
    async cancel() {
      end();
      await chunks.return(undefined);
    },
  });
  return withHeaders(new Response(stream, { headers: { "Content-Type": "application/x-ndjson" } }), passage);
}

async function* emptyLines(): AsyncGenerator<Line[]> {}

/** Runs the lines of one chunk, as far as the quota reaches; the others are told that it does not. */
async function runLines(lines: Line[], from: number, passage: Passage): Promise<ItemResult[]> {
  try {
    // The request itself is already counted as one.
    const items = passage.items === 0 ? lines.length - 1 : lines.length;
    if (items > 0) await spendItems(passage.key!, items, Date.now());
  } catch (error) {
    return lines.map((_, offset) => failedItem(error, from + offset, passage.requestId, ""));
  }
  return lines.map((line, offset) => runLine(line, from + offset, passage.requestId));
}

function runLine(line: Line, index: number, requestId: string): ItemResult {
  if ("tooLong" in line) return failedItem(refusal("body-too-large", "The line is longer than 1 MiB.", { code: "line_too_long" }), index, requestId, "");
  let item: unknown;
  try {
    item = JSON.parse(line.text);
  } catch (error) {
    const detail = `The line is not JSON: ${error instanceof Error ? error.message : "it could not be parsed"}.`;
    return failedItem(refusal("malformed-json", detail), index, requestId, "");
  }
  return runItem(item, index, requestId, "");
}

const tooManyLines = (): Problem => refusal("body-too-large", `A batch takes at most ${MOST_BATCH_LINES} lines; the rest was not read.`, { code: "too_many_lines" });
