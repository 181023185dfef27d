import { batchOperation } from "@/lib/http/batch/batchOperation";
import { otherMethods } from "@/lib/http/otherMethods";

export const POST = batchOperation;
export const { GET, PUT, PATCH, DELETE } = otherMethods("POST");
