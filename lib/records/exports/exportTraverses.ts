import type { z } from "zod";
import type { exportQuery } from "@/api-spec/records/exports";
import { log } from "@/lib/runtime/log";
import type { RecordContext } from "../context";
import { pageOf, type Page } from "../page";
import { traverseOf } from "../traverses/answer";
import { filteredTraverses, type TraverseFilters } from "../traverses/list";
import type { TraverseRow } from "../traverses/row";
import { csvHeadings, csvRows } from "./csv";

type Reading = Pick<RecordContext, "db" | "realm">;

/** Traverses read at once: a megabyte or two. */
const AT_ONCE = 50;

const FORMATS = {
  csv: { media: "text/csv; charset=utf-8; header=present", head: csvHeadings, lines: csvRows },
  ndjson: { media: "application/x-ndjson", head: () => "", lines: (traverses: ReturnType<typeof traverseOf>[]) => traverses.map((traverse) => `${JSON.stringify(traverse)}\n`).join("") },
};

/**
 * The traverses that filters leave, as a file. No more is read than has been taken, and no connection to the database is
 * held meanwhile, so that neither their number nor a slow reader costs anything.
 */
export async function exportTraverses(context: Reading, { format, ...filters }: z.output<typeof exportQuery>): Promise<Response> {
  const { media, head, lines } = FORMATS[format];
  // Read before anything is answered: what fails now is still told as a problem.
  let page = await readPage(context, filters);
  let [begun, left] = [false, false];
  const stream = new ReadableStream<Uint8Array>({
    async pull(controller) {
      try {
        if (begun) page = await readPage(context, filters, page.next!);
        if (left) return;
        controller.enqueue(Buffer.from((begun ? "" : head()) + lines(page.items.map((row) => traverseOf(row)))));
        begun = true;
        if (page.next === null) controller.close();
      } catch (error) {
        log().error({ err: error }, "an export broke off");
        controller.error(error);
      }
    },
    cancel() {
      left = true;
    },
  });
  const day = new Date().toISOString().slice(0, 10);
  return new Response(stream, { headers: { "Content-Type": media, "Content-Disposition": `attachment; filename="traverses-${day}.${format}"`, "Cache-Control": "private, no-store" } });
}

/** The first made first: an id begins with the time it was made. */
const readPage = (context: Reading, filters: TraverseFilters, after?: string): Promise<Page<TraverseRow>> =>
  pageOf(filteredTraverses(context, filters, "created"), "traverses", { column: "traverses.id", direction: "asc", valueOf: ({ id }: TraverseRow) => id }, { limit: AT_ONCE, after });
