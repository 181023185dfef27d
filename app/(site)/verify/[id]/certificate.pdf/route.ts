import { pdf } from "@/lib/http/pdf";
import { spendGuestRequest } from "@/lib/limits/guestLimit";
import { Problem, problemResponse } from "@/lib/problems/problem";
import { newId } from "@/lib/ids/newId";
import { certificateOf } from "@/lib/records/certificate";

/** The certificate, for whoever has the record's address. */
export async function GET(_request: Request, { params }: { params: Promise<{ id: string }> }): Promise<Response> {
  const { id } = await params;
  try {
    await spendGuestRequest();
    return pdf(await certificateOf(id), id);
  } catch (error) {
    if (error instanceof Problem) return problemResponse(error, newId("req"));
    throw error;
  }
}
