import { readFigure as reading } from "@/api-spec/records/traverses";
import { drawing } from "@/lib/http/drawing";
import { otherMethods } from "@/lib/http/otherMethods";
import { recordOperation } from "@/lib/http/recordOperation";
import { figureOf } from "@/lib/records/traverses/figure";
import { findTraverse } from "@/lib/records/traverses/row";

export const GET = recordOperation(reading, async (call) => drawing(figureOf(await findTraverse(call, call.params.id), call.query.size)));
export const { POST, PUT, PATCH, DELETE } = otherMethods("GET");
