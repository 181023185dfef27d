import { notFound } from "next/navigation";
import { Problem } from "@/lib/problems/problem";

/** A record for a page: where there is none, or it is another's, the page is not found. */
export async function found<Row>(row: Promise<Row>): Promise<Row> {
  try {
    return await row;
  } catch (error) {
    if (error instanceof Problem && error.slug === "not-found") notFound();
    throw error;
  }
}
