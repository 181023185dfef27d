import { z } from "zod";
import { traverseId } from "@/api-spec/records/common";
import { drawing } from "@/lib/http/drawing";
import { otherMethods } from "@/lib/http/otherMethods";
import { portalFile } from "@/lib/http/portalRecordOperation";
import { figureOf } from "@/lib/records/traverses/figure";
import { findTraverse } from "@/lib/records/traverses/row";

export const GET = portalFile(z.strictObject({ id: traverseId }), async (reading, { id }) => drawing(figureOf(await findTraverse(reading, id), "thumbnail")));
export const { POST, PUT, PATCH, DELETE } = otherMethods("GET");
